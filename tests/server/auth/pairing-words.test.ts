import { expect, test } from 'vitest';

import { newPairingCode, newPairingWords } from '@/server/auth/pairing-words';

test('a thousand codes have six signs and none that is taken for another', () => {
  for (let draw = 0; draw < 1_000; draw += 1) expect(newPairingCode()).toMatch(/^[A-Z0-9]{6}$/);
  expect(Array.from({ length: 1_000 }, newPairingCode).join('')).not.toMatch(/[01258BGILOQSZ]/);
});

test('a thousand pairs are two different plain words', () => {
  for (let draw = 0; draw < 1_000; draw += 1) {
    const [first, second, ...more] = newPairingWords().split(' ');
    expect([first, second, more]).toEqual([expect.stringMatching(/^[a-z]{4,8}$/), expect.stringMatching(/^[a-z]{4,8}$/), []]);
    expect(first).not.toBe(second);
  }
});
