const longest = 2000;

/** A path of this very service, as somewhere to go on to; undefined for whatever could lead elsewhere. */
export function ownPath(text: unknown): string | undefined {
  if (typeof text !== 'string' || text.length > longest) return undefined;
  // Browsers read \ as /, and drop tabs and line ends before they look.
  if (!/^\/(?![/\\])/.test(text) || /[\p{Cc}\\]/u.test(text)) return undefined;
  const base = 'http://own.invalid';
  if (!URL.canParse(text, base)) return undefined;
  const { origin, pathname, search, hash } = new URL(text, base);
  // What dots leave of a path can begin with two slashes.
  return origin === base && !pathname.startsWith('//') ? `${pathname}${search}${hash}` : undefined;
}
