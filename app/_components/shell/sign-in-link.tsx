'use client';

import Link from 'next/link';
import { usePathname } from 'next/navigation';

/** Pages to come back to once signed in: rooms, but neither the door itself nor a page whose address is a secret. */
const isRoom = (pathname: string): boolean => !/^\/($|sign-in|start|reset|invitation)/.test(pathname);

/** Leads to the door, and from there back to the page. */
export function SignInLink({ className, onClick }: { className?: string; onClick?: () => void }) {
  const pathname = usePathname();
  const href = isRoom(pathname) ? `/sign-in?next=${encodeURIComponent(pathname)}` : '/sign-in';
  return (
    <Link
      className={className}
      href={href}
      onClick={onClick}
      aria-current={pathname === '/sign-in' ? 'page' : undefined}
    >
      Sign in
    </Link>
  );
}
