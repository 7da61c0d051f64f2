import { fieldNameText } from '@/engine/expression/to-text';
import { Declined } from '@/lib/compute/declined';
import { Reader } from '@/lib/compute/read';
import { declined, type Reply } from '@/lib/compute/request';
import type { IdentityFilters } from '@/lib/contracts/identity-query';
import type { Problem } from '@/lib/contracts/problem';
import { searchQuery } from './words';

/** Conditions of SQL with their binds. Whatever a caller wrote is a bind. */
export class Conditions {
  readonly binds: unknown[];
  private readonly all: string[];

  constructor(groupId: string) {
    this.binds = [groupId];
    this.all = ['i.group_id = $1'];
  }

  /** Adds a value and returns how SQL refers to it. */
  bind(value: unknown): string {
    this.binds.push(value);
    return `$${this.binds.length}`;
  }

  add(condition: string): void {
    this.all.push(condition);
  }

  get sql(): string {
    return this.all.join(' AND ');
  }
}

/** The filters as conditions on identities `i`; the field is read, so that it is found however it is written. */
export function conditionsOf(groupId: string, filters: Omit<IdentityFilters, 'state'>): Reply<Conditions> {
  const conditions = new Conditions(groupId);
  const { words, field, degree, verdict, tag, keeper } = filters;
  const query = words === undefined ? undefined : searchQuery(words);
  if (query !== undefined) conditions.add(`i.words @@ to_tsquery('simple', ${conditions.bind(query)})`);
  if (field !== undefined) {
    const name = fieldText(field);
    if ('problem' in name) return declined(name.problem);
    conditions.add(`i.field = ${conditions.bind(name.text)}`);
  }
  if (degree !== undefined) conditions.add(`i.degrees @> ARRAY[${conditions.bind(degree)}::int]`);
  if (verdict !== undefined) conditions.add(`i.verdict = ${conditions.bind(verdict)}`);
  if (tag !== undefined) conditions.add(`i.tags @> ARRAY[${conditions.bind(tag)}::text]`);
  if (keeper !== undefined) conditions.add(`i.keeper_name = ${conditions.bind(keeper)}`);
  return { status: 200, answer: conditions };
}

function fieldText(written: string): { readonly text: string } | { readonly problem: Problem } {
  try {
    return { text: fieldNameText(new Reader().fieldName(written)) };
  } catch (error) {
    if (error instanceof Declined) return { problem: error.problem };
    throw error;
  }
}
