import { createHmac } from 'node:crypto';
import { expect, it } from 'vitest';
import { scramVerifier } from '@/server/setup/database/scram-verifier';

// RFC 7677, section 3: user "user", password "pencil", 4096 rounds, and the signature that the server then sends.
const salt = 'W22ZaJ0SNY7soEsUEjb6gQ==';
const authMessage =
  'n=user,r=rOprNGfwEbeRWgbNEkqO,' +
  `r=rOprNGfwEbeRWgbNEkqO%hvYDpWUa2RaTCAfuxFIlj)hNlF$k0,s=${salt},i=4096,` +
  'c=biws,r=rOprNGfwEbeRWgbNEkqO%hvYDpWUa2RaTCAfuxFIlj)hNlF$k0';
const serverSignature = '6rriTRBi23WpRR/wtup+mMhUZUn/dB5nLTJRsjl95G4=';

it('scramVerifier holds the server key of the published example', () => {
  const [method, rounds, keys] = scramVerifier('pencil', Buffer.from(salt, 'base64')).split('$');
  expect([method, rounds]).toEqual(['SCRAM-SHA-256', `4096:${salt}`]);
  const serverKey = Buffer.from(keys?.split(':')[1] ?? '', 'base64');
  expect(createHmac('sha256', serverKey).update(authMessage).digest('base64')).toBe(serverSignature);
});
