import { createHash } from 'node:crypto';
import { expect, test } from 'vitest';

import { identityCommitment } from '@/server/commands/identity-commitment';

test('identityCommitment is SHA-256 of prefix, salt and the canonical identity, and changes with the salt', () => {
  const salt = new Uint8Array(32).fill(7);
  const expected = createHash('sha256').update(Buffer.concat([Buffer.from('fascicle-identity-1\n'), salt, Buffer.from('{"patientLabel":"P","recordNumber":"1"}')])).digest('hex');
  expect(identityCommitment({ recordNumber: '1', patientLabel: 'P' }, salt)).toBe(expected);
  expect(identityCommitment({ recordNumber: '1', patientLabel: 'P' }, new Uint8Array(32))).not.toBe(expected);
});
