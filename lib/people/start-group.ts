import 'server-only';
import type { Transaction } from 'sequelize';
import { record } from '@/lib/audit/record';
import { database } from '@/lib/database/connection';
import { slugsNear } from '@/lib/contracts/slug';
import { waitWords } from '@/lib/contracts/wait';
import { Group } from '@/models/group';
import { Membership } from '@/models/membership';
import { User } from '@/models/user';
import { hashPassword } from './passwords';
import { type Refused, refuse } from './refused';
import { attempt } from './throttle';
import { brokenConstraint } from './unique';

/** Who starts a group: someone with an account, or someone who makes one with it. */
export type Founder =
  | { readonly id: string; readonly name: string }
  | { readonly name: string; readonly email: string; readonly password: string };

export interface Started {
  readonly userId: string;
  readonly sessionVersion: number;
  readonly slug: string;
}

/**
 * Starts a group: the account if there is none yet, the group, and its first steward, all of them or nothing. Starts are
 * counted by the address of the network they come from.
 */
export async function startGroup(
  wanted: { readonly name: string; readonly slug: string },
  founder: Founder,
  address: string,
): Promise<Started | Refused> {
  const seconds = await attempt('start-address', address);
  if (seconds !== undefined) return refuse(waitWords(seconds));
  // Hashing takes long, and no transaction should wait for it.
  const passwordHash = 'password' in founder ? await hashPassword(founder.password) : undefined;
  try {
    return await database().transaction(async (transaction) => {
      const user =
        'password' in founder
          ? await User.create(
              { name: founder.name, email: founder.email, passwordHash: passwordHash ?? '' },
              { transaction },
            )
          : await User.findByPk(founder.id, { transaction, rejectOnEmpty: true });
      const group = await Group.create(wanted, { transaction });
      await Membership.create({ groupId: group.id, userId: user.id, role: 'steward' }, { transaction });
      await noteStart(group, user, transaction);
      return { userId: user.id, sessionVersion: user.sessionVersion, slug: group.slug };
    });
  } catch (error) {
    const broken = brokenConstraint(error);
    if (broken === 'groups_slug_key') return refuse(await takenSlug(wanted.slug), 'slug');
    if (broken === 'users_email_key')
      return refuse('There is an account with this address. Sign in with it, then start the group.', 'email');
    throw error;
  }
}

const noteStart = (group: Group, user: User, transaction: Transaction): Promise<void> =>
  record({ groupId: group.id, actor: user, action: 'group-started', subject: group.name }, transaction);

async function takenSlug(slug: string): Promise<string> {
  const near = slugsNear(slug);
  const taken = new Set((await Group.findAll({ where: { slug: [...near] } })).map((group) => group.slug));
  const free = near.find((one) => !taken.has(one));
  return free === undefined
    ? `Another group is called “${slug}”. Choose another short name.`
    : `Another group is called “${slug}”. “${free}” is free.`;
}
