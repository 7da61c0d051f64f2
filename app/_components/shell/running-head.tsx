import Link from 'next/link';
import { Logo } from '../marks/logo';
import { RoomsNav } from './rooms-nav';
import { SignInLink } from './sign-in-link';
import type { Who } from './who';

/** Mark and rooms; at the right the group and the person, or the way to sign in. */
export function RunningHead({ who: { person, group } }: { who: Who }) {
  return (
    <header className="head">
      <Link className="brand" href="/">
        <Logo />
        Quadrel
      </Link>
      <RoomsNav />
      <div className="who">
        {group !== undefined && (
          <Link className="it" href="/group">
            {group}
          </Link>
        )}
        {person === undefined ? <SignInLink /> : <Link href="/account">{person}</Link>}
      </div>
    </header>
  );
}
