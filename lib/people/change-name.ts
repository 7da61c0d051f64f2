import 'server-only';
import { database } from '@/lib/database/connection';
import { User } from '@/models/user';

/** Gives a person another name. What was done before stays written down under the earlier one. */
export async function changeName(userId: string, name: string): Promise<void> {
  database();
  await User.update({ name }, { where: { id: userId } });
}
