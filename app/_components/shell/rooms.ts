import type { Route } from 'next';

export interface Room {
  readonly href: Route;
  readonly name: string;
  /** What one does there, for the contents. */
  readonly says: string;
  /** Pages of the room that stand elsewhere. */
  readonly also?: string;
}

/** The rooms, in the order of the running head. A new room is one line here. */
export const rooms: readonly Room[] = [
  { href: '/bench', name: 'Bench', says: 'one statement at a time: its canonical form, a verdict, and the reason' },
  {
    href: '/register',
    name: 'Register',
    says: 'the identities a group keeps: stated, checked, citable, found again by their words',
    also: '/identities',
  },
  {
    href: '/help',
    name: 'Help',
    says: 'the language, the conventions, what is decided over which field, and the REST API',
  },
];

export const isIn = (pathname: string, room: Pick<Room, 'href' | 'also'>): boolean =>
  [room.href, room.also].some((path) => path !== undefined && (pathname === path || pathname.startsWith(`${path}/`)));
