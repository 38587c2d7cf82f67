import { v7 as newId } from 'uuid';

import { findCredentialsByEmail } from '@/db/repositories/people/find-credentials-by-email';
import { insertAccessToken } from '@/db/repositories/tokens/insert-access-token';
import { accessTokenHash, newAccessToken } from '@/server/auth/access-token';
import type { TestHouse } from '@/tests/server/house/open-test-house';

/** A good token of a demo person, with its id. */
export async function tokenOf(house: TestHouse, email: string): Promise<{ id: string; token: string }> {
  const person = await findCredentialsByEmail(house.admin, email);
  if (person === null) throw new Error(`There is no demo person ${email}.`);
  const [id, token] = [newId(), newAccessToken()];
  await insertAccessToken(house.admin, { id, tokenHash: accessTokenHash(token), personId: person.personId, label: 'A test', expiresAt: new Date(Date.now() + 3_600_000).toISOString() });
  return { id, token };
}
