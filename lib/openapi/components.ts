import type { SchemaObject } from 'openapi3-ts/oas31';
import { z } from 'zod';
import { chainStep, comparedMap, comparedPart, compareAnswer, compareRequest, evidence } from '@/lib/contracts/compare';
import { compareManyAnswer, compareManyItem, compareManyRequest } from '@/lib/contracts/compare-many';
import { healthAnswer } from '@/lib/contracts/health';
import { exportAnswer, visibilityRequest, withdrawRequest } from '@/lib/contracts/identities';
import {
  checkAnswer,
  checkEvidence,
  checkSummary,
  identityAnswer,
  identitySummary,
  revisionAnswer,
} from '@/lib/contracts/identity-answer';
import { identityContent, identityRevision } from '@/lib/contracts/identity-content';
import { identityList } from '@/lib/contracts/identity-query';
import { derivationStep, normalizeAnswer, normalizedPart, normalizeRequest } from '@/lib/contracts/normalize';
import { openApiAnswer } from '@/lib/contracts/openapi';
import { problem } from '@/lib/contracts/problem';
import { residueAnswer, residuesAnswer, residuesRequest } from '@/lib/contracts/residues';
import { tokenAnswer } from '@/lib/contracts/token';
import { fieldAnswer, typeset } from '@/lib/contracts/typeset';

/** What callers send. Defaults make a key one that may be left out, where in an answer it is always there. */
const sent: Readonly<Record<string, z.ZodType>> = {
  NormalizeRequest: normalizeRequest,
  CompareRequest: compareRequest,
  CompareManyRequest: compareManyRequest,
  ResiduesRequest: residuesRequest,
  IdentityContent: identityContent,
  IdentityRevision: identityRevision,
  WithdrawRequest: withdrawRequest,
  VisibilityRequest: visibilityRequest,
};

/** What callers are sent. */
const received: Readonly<Record<string, z.ZodType>> = {
  Typeset: typeset,
  Field: fieldAnswer,
  Problem: problem,
  NormalizeAnswer: normalizeAnswer,
  NormalizedPart: normalizedPart,
  DerivationStep: derivationStep,
  CompareAnswer: compareAnswer,
  ComparedPart: comparedPart,
  ComparedMap: comparedMap,
  Evidence: evidence,
  ChainStep: chainStep,
  CompareManyAnswer: compareManyAnswer,
  CompareManyItem: compareManyItem,
  ResiduesAnswer: residuesAnswer,
  Residue: residueAnswer,
  Identity: identityAnswer,
  IdentitySummary: identitySummary,
  IdentityList: identityList,
  IdentityExport: exportAnswer,
  Revision: revisionAnswer,
  Check: checkAnswer,
  CheckSummary: checkSummary,
  CheckEvidence: checkEvidence,
  Token: tokenAnswer,
  Health: healthAnswer,
  OpenApiDocument: openApiAnswer,
};

export const reference = (name: string): string => `#/components/schemas/${name}`;

/** The name under which a schema stands in the document. Throws when it has none. */
export function nameOf(schema: z.ZodType): string {
  const found = Object.entries({ ...sent, ...received }).find(([, candidate]) => candidate === schema);
  if (found === undefined) throw new Error('A contract uses a schema that the document does not name.');
  return found[0];
}

/** The named schemas as JSON Schema 2020-12, the dialect of OpenAPI 3.1; wherever one occurs in another it is referred to. */
export const componentSchemas = (): Record<string, SchemaObject> => ({
  ...schemasOf(sent, 'input'),
  ...schemasOf(received, 'output'),
});

function schemasOf(named: Readonly<Record<string, z.ZodType>>, io: 'input' | 'output'): Record<string, SchemaObject> {
  const registry = z.registry<{ id: string }>();
  for (const [id, schema] of Object.entries(named)) registry.add(schema, { id });
  const { schemas } = z.toJSONSchema(registry, { uri: reference, io });
  return Object.fromEntries(
    Object.entries(schemas).map(([name, schema]) => {
      const { $schema: _dialect, $id: _id, ...rest } = schema;
      // JSON Schema 2020-12 is what OpenAPI 3.1 calls a schema object; the two packages type it apart.
      return [name, rest as SchemaObject];
    }),
  );
}
