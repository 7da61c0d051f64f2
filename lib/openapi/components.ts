import type { SchemaObject } from 'openapi3-ts/oas31';
import { z } from 'zod';
import { chainStep, comparedMap, comparedPart, compareAnswer, compareRequest, evidence } from '@/lib/contracts/compare';
import { compareManyAnswer, compareManyItem, compareManyRequest } from '@/lib/contracts/compare-many';
import { healthAnswer } from '@/lib/contracts/health';
import { derivationStep, normalizeAnswer, normalizedPart, normalizeRequest } from '@/lib/contracts/normalize';
import { openApiAnswer } from '@/lib/contracts/openapi';
import { problem } from '@/lib/contracts/problem';
import { residueAnswer, residuesAnswer, residuesRequest } from '@/lib/contracts/residues';
import { fieldAnswer, typeset } from '@/lib/contracts/typeset';

/** The schemas that have a name in the document; wherever one occurs in another it is referred to. */
const named: Readonly<Record<string, z.ZodType>> = {
  Typeset: typeset,
  Field: fieldAnswer,
  Problem: problem,
  NormalizeRequest: normalizeRequest,
  NormalizeAnswer: normalizeAnswer,
  NormalizedPart: normalizedPart,
  DerivationStep: derivationStep,
  CompareRequest: compareRequest,
  CompareAnswer: compareAnswer,
  ComparedPart: comparedPart,
  ComparedMap: comparedMap,
  Evidence: evidence,
  ChainStep: chainStep,
  CompareManyRequest: compareManyRequest,
  CompareManyAnswer: compareManyAnswer,
  CompareManyItem: compareManyItem,
  ResiduesRequest: residuesRequest,
  ResiduesAnswer: residuesAnswer,
  Residue: residueAnswer,
  Health: healthAnswer,
  OpenApiDocument: openApiAnswer,
};

export const reference = (name: string): string => `#/components/schemas/${name}`;

/** The name under which a schema stands in the document. Throws when it has none. */
export function nameOf(schema: z.ZodType): string {
  const found = Object.entries(named).find(([, candidate]) => candidate === schema);
  if (found === undefined) throw new Error('A contract uses a schema that the document does not name.');
  return found[0];
}

/** The named schemas as JSON Schema 2020-12, the dialect of OpenAPI 3.1. */
export function componentSchemas(): Record<string, SchemaObject> {
  const registry = z.registry<{ id: string }>();
  for (const [id, schema] of Object.entries(named)) registry.add(schema, { id });
  const { schemas } = z.toJSONSchema(registry, { uri: reference });
  return Object.fromEntries(
    Object.entries(schemas).map(([name, schema]) => {
      const { $schema: _dialect, $id: _id, ...rest } = schema;
      // JSON Schema 2020-12 is what OpenAPI 3.1 calls a schema object; the two packages type it apart.
      return [name, rest as SchemaObject];
    }),
  );
}
