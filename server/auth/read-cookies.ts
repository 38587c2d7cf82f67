/** Cookies of a request by name. What cannot be decoded is left out: a client may send anything. */
export function readCookies(header: string | null): ReadonlyMap<string, string> {
  const jar = new Map<string, string>();
  for (const part of (header ?? '').slice(0, 16_384).split(/;\s*/)) {
    const at = part.indexOf('=');
    if (at < 1) continue;
    const value = decoded(part.slice(at + 1));
    if (value !== null && !jar.has(part.slice(0, at))) jar.set(part.slice(0, at), value);
  }
  return jar;
}

function decoded(text: string): string | null {
  try {
    return decodeURIComponent(text);
  } catch {
    return null;
  }
}
