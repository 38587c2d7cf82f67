import { expect, it } from 'vitest';
import { rolePassword } from '@/server/setup/role-passwords';

it('rolePassword is the HMAC-SHA256 that openssl gives', () => {
  // printf fascicle_app | openssl dgst -sha256 -hmac 'a secret of thirty-two characters' -binary | base64, made safe for addresses
  expect(rolePassword('a secret of thirty-two characters', 'fascicle_app')).toBe('APsC1RifXTZupr6OOFQUXABS1srg8OnbIgQR6v95qhw');
});

it('rolePassword differs from role to role and from secret to secret', () => {
  const words = [rolePassword('one', 'fascicle_app'), rolePassword('one', 'fascicle_feed'), rolePassword('two', 'fascicle_app')];
  expect(new Set(words).size).toBe(3);
});
