import type { Route } from 'next';
import Link from 'next/link';

/** The way to older tokens, and back to the newest. */
export function OlderTokens({ path, older, first }: { path: Route; older: string | undefined; first: boolean }) {
  if (older === undefined && first) return null;
  return (
    <p className="acts mt-4">
      {older !== undefined && <Link href={`${path}?after=${older}` as Route}>Older tokens</Link>}
      {!first && <Link href={path}>The newest</Link>}
    </p>
  );
}
