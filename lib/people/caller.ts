import type { MemberRole } from '@/models/role';
import type { Scope } from '@/models/scope';

/** Someone without an account, or with one and in no group. */
export interface Visitor {
  readonly kind: 'visitor';
  /** Who it is, when signed in. */
  readonly person?: Person;
}

/** A member of a group, acting in it: signed in, or a script with a token. */
export interface Member {
  readonly kind: 'member';
  readonly person: Person;
  readonly group: GroupSeat;
  /** The token that the caller came with; without one it is a session. */
  readonly token?: HeldToken;
}

export type Caller = Visitor | Member;

export interface Person {
  readonly id: string;
  readonly name: string;
  readonly email: string;
}

/** A group and the caller's role in it. */
export interface GroupSeat {
  readonly id: string;
  readonly name: string;
  readonly slug: string;
  readonly role: MemberRole;
}

export interface HeldToken {
  readonly id: string;
  readonly name: string;
  readonly scopes: readonly Scope[];
  readonly expiresAt: Date;
}

export const visitor: Visitor = { kind: 'visitor' };
