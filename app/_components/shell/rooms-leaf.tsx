'use client';

import Link from 'next/link';
import { usePathname } from 'next/navigation';
import { Button } from '../button/button';
import { Leaf } from '../leaf/leaf';
import { ThemeChoice } from '../theme/theme-choice';
import { isIn, rooms } from './rooms';
import { SignInLink } from './sign-in-link';
import type { Who } from './who';

interface Props {
  open: boolean;
  onClose: () => void;
  who: Who;
}

/** The list of rooms, the group and the person, and the theme. */
export function RoomsLeaf({ open, onClose, who: { person, group } }: Props) {
  const pathname = usePathname();
  const current = (room: Parameters<typeof isIn>[1]) => (isIn(pathname, room) ? 'page' : undefined);
  return (
    <Leaf open={open} onClose={onClose} title="Rooms">
      <nav className="room-list" aria-label="Rooms">
        {rooms.map((room) => (
          <Link key={room.href} href={room.href} aria-current={current(room)} onClick={onClose}>
            {room.name}
          </Link>
        ))}
      </nav>
      <nav className="room-list mt-6" aria-label="Group and person">
        {group !== undefined && (
          <Link className="italic" href="/group" aria-current={current({ href: '/group' })} onClick={onClose}>
            {group}
          </Link>
        )}
        {person === undefined ? (
          <SignInLink onClick={onClose} />
        ) : (
          <Link href="/account" aria-current={current({ href: '/account' })} onClick={onClose}>
            {person}
          </Link>
        )}
      </nav>
      <div className="mt-5">
        <span className="label">Theme</span>
        <ThemeChoice />
      </div>
      <div className="btns">
        <Button onClick={onClose}>Close</Button>
      </div>
    </Leaf>
  );
}
