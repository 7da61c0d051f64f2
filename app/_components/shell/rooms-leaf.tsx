'use client';

import Link from 'next/link';
import { usePathname } from 'next/navigation';
import { Button } from '../button/button';
import { Leaf } from '../leaf/leaf';
import { ThemeChoice } from '../theme/theme-choice';
import { isIn, rooms } from './rooms';

/** The list of rooms, and the theme. */
export function RoomsLeaf({ open, onClose }: { open: boolean; onClose: () => void }) {
  const pathname = usePathname();
  return (
    <Leaf open={open} onClose={onClose} title="Rooms">
      <nav className="room-list" aria-label="Rooms">
        {rooms.map((room) => (
          <Link
            key={room.href}
            href={room.href}
            aria-current={isIn(pathname, room) ? 'page' : undefined}
            onClick={onClose}
          >
            {room.name}
          </Link>
        ))}
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
