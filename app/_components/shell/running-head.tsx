import Link from 'next/link';
import { Logo } from '../marks/logo';
import { RoomsNav } from './rooms-nav';

/** Mark and rooms. */
export function RunningHead() {
  return (
    <header className="head">
      <Link className="brand" href="/">
        <Logo />
        Quadrel
      </Link>
      <RoomsNav />
    </header>
  );
}
