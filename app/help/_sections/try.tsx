import Link from 'next/link';

/** An example that opens on the bench. */
export function Try({ field = 'Q', statement }: { field?: string; statement: string }) {
  const query = new URLSearchParams({ field, statement }).toString();
  return (
    <Link className="path" href={`/bench?${query}`}>
      {statement}
      {field !== 'Q' && <span className="sr"> over {field}</span>}
    </Link>
  );
}
