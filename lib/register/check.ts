import 'server-only';
import { engineVersion } from '@/engine/version';
import { compute } from '@/lib/compute/pool';
import { declined, isAnswer, type Reply } from '@/lib/compute/request';
import type { CheckEvidence } from '@/lib/contracts/identity-answer';
import { type Problem, problemOf } from '@/lib/contracts/problem';
import type { CheckVerdict } from '@/models/identity-words';
import { degreesOf, sentenceOf } from './verdict';
import type { Wording } from './wording';

/** What came out of one check, ready to be kept. */
export interface Checked {
  readonly verdict: CheckVerdict;
  readonly engine: string;
  readonly durationMs: number;
  readonly degrees: readonly number[];
  readonly evidence: CheckEvidence;
}

type Found = Omit<Checked, 'durationMs' | 'engine'>;

/**
 * Has the engine check what a revision says, within the interactive budget. What is outside of what it decides, or past its
 * limits, is a check without a verdict; what is wrong with the texts is a problem.
 */
export async function checkWording(wording: Wording, signal?: AbortSignal): Promise<Reply<Checked>> {
  const begun = performance.now();
  const found = await (wording.kind === 'residue' ? checkResidue(wording, signal) : checkEquality(wording, signal));
  if ('problem' in found) return declined(found.problem);
  const durationMs = Math.round(performance.now() - begun);
  return { status: 200, answer: { ...found, engine: engineVersion, durationMs } };
}

async function checkEquality(wording: Wording, signal?: AbortSignal): Promise<Found | { problem: Problem }> {
  const { field, statement, hypotheses } = wording;
  const reply = await compute('compare', { field, statement, hypotheses, forms: true }, { signal });
  if (!isAnswer(reply)) return withoutVerdict(reply.problem) ?? { problem: reply.problem };
  const compare = reply.answer;
  return {
    verdict: compare.verdict,
    degrees: degreesOf(compare),
    evidence: { sentence: sentenceOf(compare), compare },
  };
}

/** A residue is computed and then compared with the value over the residue field. */
async function checkResidue(wording: Wording, signal?: AbortSignal): Promise<Found | { problem: Problem }> {
  const { field, statement: expression, place = '', uniformizer, value = '' } = wording;
  const asked = { field, expression, places: [place], ...(uniformizer === undefined ? {} : { uniformizer }) };
  const computed = await compute('residues', asked, { signal });
  if (!isAnswer(computed)) return withoutVerdict(computed.problem) ?? { problem: renamed(computed.problem) };
  const residues = computed.answer;
  const [residue] = residues.residues;
  if (residue === undefined) throw new Error('No residue was computed at the place that was asked for.');
  const sides = { field: residue.residueField, left: residue.value.text, right: value, forms: true };
  const compared = await compute('compare', sides, { signal });
  if (!isAnswer(compared)) {
    const problem = compared.problem.part === 'left' ? tooLong : renamed(compared.problem);
    const found = withoutVerdict(problem);
    return found === undefined ? { problem } : { ...found, evidence: { ...found.evidence, residues } };
  }
  const compare = compared.answer;
  return {
    verdict: compare.verdict,
    // The residue lowers the degree by one; the register is searched by the degree of the class.
    degrees: degreesOf(compare).map((degree) => degree + 1),
    evidence: { sentence: sentenceOf(compare, 'Residue and value'), residues, compare },
  };
}

const tooLong = problemOf('size', 'The residue is too long to be compared with the value.');

/** A question that the engine does not decide, or not within its limits, was asked properly. */
function withoutVerdict(problem: Problem): Found | undefined {
  const verdict = problem.code === 'not-yet' ? 'refused' : isLimit(problem.code) ? 'stopped' : undefined;
  return verdict === undefined
    ? undefined
    : { verdict, degrees: [], evidence: { sentence: problem.detail, problem: renamed(problem) } };
}

const isLimit = (code: Problem['code']): boolean => code === 'budget' || code === 'size';

/** The keys of an identity for those of the questions to the engine. */
const keys: Readonly<Record<string, string>> = { expression: 'statement', 'places[0]': 'place', right: 'value' };

function renamed(problem: Problem): Problem {
  const fromCode = problem.code === 'place' || problem.code === 'uniformizer' ? problem.code : undefined;
  const part = problem.part === undefined ? fromCode : (keys[problem.part] ?? problem.part);
  return part === undefined ? problem : { ...problem, part };
}
