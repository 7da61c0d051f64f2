import 'server-only';
import { unstable_rethrow } from 'next/navigation';
import { currentCaller } from '@/lib/people/current';
import type { Who } from './who';

/** Who reads the page. While the database does not answer it is nobody, so that what needs none can still be read. */
export async function whoIsHere(): Promise<Who> {
  try {
    const caller = await currentCaller();
    return { person: caller.person?.name, group: caller.kind === 'member' ? caller.group.name : undefined };
  } catch (error) {
    unstable_rethrow(error);
    console.error('Nobody could be recognised:', error);
    return {};
  }
}
