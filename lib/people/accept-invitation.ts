import 'server-only';
import type { Transaction } from 'sequelize';
import { record } from '@/lib/audit/record';
import { database } from '@/lib/database/connection';
import { Invitation } from '@/models/invitation';
import { Membership } from '@/models/membership';
import { User } from '@/models/user';
import { findInvitation, type OpenInvitation } from './open-invitation';
import { hashPassword } from './passwords';
import { type Refused, isRefused, refuse } from './refused';
import { lockGroup, roleIn } from './steward';
import { brokenConstraint } from './unique';

export interface Joined {
  readonly userId: string;
  readonly sessionVersion: number;
  readonly groupName: string;
  readonly slug: string;
}

const noLongerOpen = 'This invitation is no longer open. Read the page again; it says what can be done.';
const signInFirst = 'There is an account with this address now. Read the page again and sign in with it.';

/** Accepts an invitation by making the account it was sent to. */
export async function acceptAsNewcomer(
  token: string,
  { name, password }: { readonly name: string; readonly password: string },
): Promise<Joined | Refused> {
  // An argon2 hash is dear: it is made only for a link that was open a moment ago.
  const seen = await findInvitation(token);
  if (seen.state !== 'open') return refuse(noLongerOpen);
  const passwordHash = await hashPassword(password);
  try {
    return await accept(token, async (invitation, transaction) =>
      invitation.hasAccount
        ? refuse(signInFirst)
        : User.create({ name, email: invitation.email, passwordHash }, { transaction }),
    );
  } catch (error) {
    if (brokenConstraint(error) === 'users_email_key') return refuse(signInFirst);
    throw error;
  }
}

/** Accepts an invitation as someone who has an account: the one with the address it was sent to, and no other. */
export async function acceptAs(token: string, userId: string): Promise<Joined | Refused> {
  return accept(token, async (invitation, transaction) => {
    const user = await User.findByPk(userId, { transaction, rejectOnEmpty: true });
    return user.email === invitation.email
      ? user
      : refuse(`This invitation is for ${invitation.email}. Only the account with that address can accept it.`);
  });
}

/**
 * Uses an invitation up and seats the person, in one transaction. The group is locked before the invitation, as everywhere
 * else, so that neither two who accept nor a steward who takes it back meanwhile can come between.
 */
async function accept(
  token: string,
  personOf: (invitation: OpenInvitation, transaction: Transaction) => Promise<User | Refused>,
): Promise<Joined | Refused> {
  return database().transaction(async (transaction) => {
    const seen = await findInvitation(token, transaction);
    if (seen.state !== 'open') return refuse(noLongerOpen);
    const group = await lockGroup(seen.groupId, transaction);
    const invitation = await findInvitation(token, transaction, true);
    if (group === null || invitation.state !== 'open') return refuse(noLongerOpen);
    const person = await personOf(invitation, transaction);
    if (isRefused(person)) return person;
    const { groupId, groupName, slug, role, email } = invitation;
    await Invitation.update({ acceptedAt: new Date() }, { where: { id: invitation.id }, transaction });
    // Whoever is a member already, by an earlier invitation, keeps the role.
    if ((await roleIn(groupId, person.id, transaction)) === undefined) {
      await Membership.create({ groupId, userId: person.id, role }, { transaction });
      await record({ groupId, actor: person, action: 'member-joined', subject: email, detail: { role } }, transaction);
    }
    return { userId: person.id, sessionVersion: person.sessionVersion, groupName, slug };
  });
}
