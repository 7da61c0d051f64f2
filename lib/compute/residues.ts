import type { Budget } from '@/engine/arith/budget';
import type { Residue } from '@/engine/decide/outcome';
import { residues } from '@/engine/decide/residues';
import { elementTex, fieldNameTex } from '@/engine/expression/to-tex';
import { elementText } from '@/engine/expression/to-text';
import { engineVersion } from '@/engine/version';
import { readFieldName } from '@/grammar/read';
import type { ResidueAnswer, ResiduesAnswer, ResiduesRequest } from '@/lib/contracts/residues';
import { fieldOf } from './fields';
import type { Reader } from './read';
import { showExpression, showField } from './show';

/** The residues and specialisations of a class, at the places asked for or at all where it ramifies. */
export function answerResidues(body: ResiduesRequest, reader: Reader, budget: Budget): ResiduesAnswer {
  const expression = reader.expression('expression', body.expression);
  const uniformizer = body.uniformizer === undefined ? undefined : reader.element('uniformizer', body.uniformizer);
  const resolved = fieldOf(reader.fieldName(body.field), budget);
  const { field } = resolved;
  const places = body.places?.map((text, index) => ({ text, element: () => reader.element(`places[${index}]`, text) }));
  const outcome = residues(field, expression, { places, uniformizer }, budget);
  return {
    engine: engineVersion,
    field: showField(resolved),
    expression: showExpression(expression),
    residues: outcome.residues.map(showResidue),
    unramifiedElsewhere: outcome.unramifiedElsewhere,
  };
}

const showResidue = (residue: Residue): ResidueAnswer => ({
  place: residue.place,
  residueField: residue.residueField,
  residueFieldTex: fieldNameTex(readFieldName(residue.residueField)),
  uniformizer: elementText(residue.uniformizer),
  uniformizerTex: elementTex(residue.uniformizer),
  value: showExpression(residue.value),
  degree: residue.degree,
  zero: residue.zero,
  specialisation: showExpression(residue.specialisation),
});
