import { failure } from '@/server/failure';

/** A whole number from the query of an address, inside its bounds; `fallback` when it is not there. */
export function readCount(request: Request, name: string, bounds: { min: number; max: number; fallback: number }): number {
  const text = new URL(request.url).searchParams.get(name);
  if (text === null) return bounds.fallback;
  const count = /^\d{1,15}$/.test(text) ? Number(text) : Number.NaN;
  if (count >= bounds.min && count <= bounds.max) return count;
  throw failure('bad-request', 'bad-request', `Out of range: a whole number from ${bounds.min} to ${bounds.max} is allowed (${name}).`, name);
}
