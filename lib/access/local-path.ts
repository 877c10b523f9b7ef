/**
 * A path within this service to go to after signing in, or the fallback. What would leave the service is refused: other hosts,
 * `//host`, `/\host`, other schemes, control characters (browsers drop tabs and line feeds inside an address).
 */
export function localPath(value: unknown, fallback = '/portfolios'): string {
  if (typeof value !== 'string' || !/^\/(?![/\\])/.test(value) || value.length > 2000) return fallback;
  for (const character of value) if (character < ' ' || character === '\u007f' || character === '\\') return fallback;
  const base = 'http://local.invalid';
  if (!URL.canParse(value, base)) return fallback;
  const address = new URL(value, base);
  // Dot segments may leave `//host` behind, which a browser would take for another host.
  if (address.origin !== base || address.pathname.startsWith('//')) return fallback;
  return `${address.pathname}${address.search}${address.hash}`;
}
