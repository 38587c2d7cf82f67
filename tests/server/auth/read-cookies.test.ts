import { describe, expect, test } from 'vitest';

import { readCookies } from '@/server/auth/read-cookies';

describe('readCookies', () => {
  test('reads names and decoded values, the first of two with one name', () => {
    expect([...readCookies('a=1; b=%20x; a=2;c=d=e')]).toEqual([['a', '1'], ['b', ' x'], ['c', 'd=e']]);
  });

  test('leaves out what cannot be decoded, what has no name, and nothing at all', () => {
    expect([...readCookies('a=%E0%A4%A; =x; b; c=ok')]).toEqual([['c', 'ok']]);
    expect([...readCookies(null)]).toEqual([]);
  });
});
