'use client';

import Link from 'next/link';
import { usePathname } from 'next/navigation';
import { useOpenLeaf } from '../keys/keys-provider';
import { isIn, rooms } from './rooms';

/** The rooms in the running head; on a narrow page a button that opens them on a leaf. */
export function RoomsNav() {
  const pathname = usePathname();
  const openLeaf = useOpenLeaf();
  return (
    <>
      <nav className="rooms" aria-label="Rooms">
        {rooms.map((room) => (
          <Link key={room.href} href={room.href} aria-current={isIn(pathname, room) ? 'page' : undefined}>
            {room.name}
          </Link>
        ))}
      </nav>
      <button type="button" className="rooms-open" aria-haspopup="dialog" onClick={() => openLeaf('rooms')}>
        Rooms
      </button>
    </>
  );
}
