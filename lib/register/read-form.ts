import 'server-only';
import type { z } from 'zod';
import { limits } from '@/lib/contracts/identity-content';
import { type IdentityForm, identityForm } from '@/lib/contracts/identity-draft';
import type { IdentityOutcome } from '@/lib/contracts/identity-outcome';
import type { Problem } from '@/lib/contracts/problem';

/** What a form says, in the shape of a request: blank fields are left out, tags are taken apart. */
export function contentOfForm(form: IdentityForm): Readonly<Record<string, unknown>> {
  const given = (text: string): string | undefined => (text.trim() === '' ? undefined : text);
  const residue = form.kind === 'residue';
  return withoutBlanks({
    name: form.name,
    kind: form.kind,
    field: form.field,
    statement: form.statement,
    place: residue ? given(form.place) : undefined,
    uniformizer: residue ? given(form.uniformizer) : undefined,
    value: residue ? given(form.value) : undefined,
    warning: form.warning,
    reference: given(form.reference),
    doi: given(form.doi),
    arxiv: given(form.arxiv),
    tags: form.tags.split(/[\s,;]+/).filter((tag) => tag !== ''),
    remark: given(form.remark),
  });
}

const withoutBlanks = (content: Readonly<Record<string, unknown>>) =>
  Object.fromEntries(Object.entries(content).filter(([, value]) => value !== undefined));

/** A form as the browser sent it; undefined for anything else. */
export const formOfBrowser = (form: unknown): IdentityForm | undefined => {
  const read = identityForm.safeParse(form);
  return read.success ? read.data : undefined;
};

const isKey = (key: PropertyKey | undefined): key is keyof IdentityForm =>
  typeof key === 'string' && key in identityForm.shape;

const missing: Partial<Record<keyof IdentityForm, string>> = {
  name: 'Give it a name, so that it can be found.',
  field: 'Name the field it is over.',
  statement: 'Write what it says, with = between the sides.',
};

const longest: Partial<Record<keyof IdentityForm, number>> = limits;

/** A sentence for each field of a form that a schema does not let through. */
export function errorsOfShape({ issues }: z.ZodError): IdentityOutcome {
  const errors: Partial<Record<keyof IdentityForm, string>> = {};
  for (const { path, code, message } of issues) {
    const [key] = path;
    if (!isKey(key)) continue;
    const own = code === 'too_small' ? missing[key] : code === 'too_big' ? tooLong(key) : undefined;
    errors[key] ??= own ?? message;
  }
  return Object.keys(errors).length > 0 ? { errors } : { fault: 'Something in the form cannot be kept. Look it over.' };
}

const tooLong = (key: keyof IdentityForm): string | undefined => {
  if (key === 'tags') return `At most ${limits.tags} tags, each of at most 40 characters.`;
  const most = longest[key];
  return most === undefined ? undefined : `This is too long: at most ${most.toLocaleString('en-GB')} characters.`;
};

/** Where a problem with one of the texts is said: at its field, with the column in it. */
export function outcomeOfProblem(problem: Problem): IdentityOutcome {
  if (problem.code === 'conflict') return { conflict: problem.current as IdentityOutcome['conflict'] };
  const key = problem.part?.split(/[.[]/)[0];
  if (!isKey(key) || key === 'warning') return { fault: problem.detail };
  return { errors: { [key]: problem.detail } };
}
