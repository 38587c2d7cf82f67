import { hash, verify } from '@node-rs/argon2';

// argon2id with 19 MiB, two passes, one lane: the library's own defaults, named so that an update cannot weaken them.
const strength = { memoryCost: 19_456, timeCost: 2, parallelism: 1 } as const;

let unknownPersonsHash: Promise<string> | null = null;

/** Hash of a password as it is stored. */
function hashPassword(password: string): Promise<string> {
  return hash(password, strength);
}

/** Whether the password is right. Without a stored hash the same work is done, so that time does not tell who exists. */
export async function isPasswordRight(storedHash: string | null, password: string): Promise<boolean> {
  unknownPersonsHash ??= hashPassword('nobody has this password');
  const isRight = await verify(storedHash ?? (await unknownPersonsHash), password).catch(() => false);
  return storedHash !== null && isRight;
}
