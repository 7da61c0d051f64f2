import type { z } from 'zod';

type Read<Schema extends z.ZodType> =
  { readonly given: z.output<Schema> } | { readonly errors: Readonly<Record<string, string>> };

/** Reads the fields of a form by a schema: what was given, or a sentence for each field that has to change. */
export function readForm<Schema extends z.ZodObject>(schema: Schema, form: unknown): Read<Schema> {
  const texts = Object.keys(schema.shape).map((name) => {
    const value = form instanceof FormData ? form.get(name) : null;
    return [name, typeof value === 'string' ? value : undefined];
  });
  const read = schema.safeParse(Object.fromEntries(texts));
  if (read.success) return { given: read.data };
  const errors: Record<string, string> = {};
  for (const { path, message } of read.error.issues) errors[String(path[0])] ??= message;
  return { errors };
}

/** What an action answers when a service refused: at the field it concerns, else for the whole form. */
export const refusal = ({ refused, field }: { readonly refused: string; readonly field?: string }) =>
  field === undefined ? { fault: refused } : { errors: { [field]: refused } };
