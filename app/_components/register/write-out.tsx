import type { IdentityQuery } from '@/lib/contracts/identity-query';
import { registerHref } from './address';

/** How the register can be written out. */
const formats = [
  { format: 'tex', name: 'TeX' },
  { format: 'bibtex', name: 'BibTeX' },
  { format: 'csv', name: 'CSV' },
  { format: 'json', name: 'JSON' },
] as const;

/** Writes what the filters leave out into a file. */
export function WriteOut({ query }: { readonly query: IdentityQuery }) {
  const search = registerHref(query, { sort: undefined }).split('?')[1];
  return (
    <details className="opens">
      <summary className="pick">write out as</summary>
      <ul className="opened">
        {formats.map(({ format, name }) => (
          <li key={format}>
            <a href={`/register/write-out?${search === undefined ? '' : `${search}&`}format=${format}`} download>
              {name}
            </a>
          </li>
        ))}
      </ul>
    </details>
  );
}
