import type { Client } from 'pg';
import { loginRoles, rolePassword, type LoginRole } from '../role-passwords';
import { SetupFailure } from '../setup-failure.mjs';
import { hasCode } from './answers-queries';
import { openAdministrator } from './open-administrator';
import { scramVerifier } from './scram-verifier';
import { whatServerLacks } from './what-server-lacks';

export type DatabaseAddresses = Readonly<{ appUrl: string; feedUrl: string; auditUrl: string; migrateUrl: string }>;
export type PreparedDatabase = DatabaseAddresses & Readonly<{ noted: readonly string[] }>;

/**
 * Makes a server ready for the migrations: the database of the address exists, the server keeps what it acknowledges, and
 * every login role exists with the password that follows from the secret. Tables and rights belong to the migrations.
 */
export async function prepareDatabase(options: { adminUrl: string; secret: string }): Promise<PreparedDatabase> {
  const client = await openAdministrator(options.adminUrl);
  try {
    const { refused, noted } = await whatServerLacks(client);
    if (refused.length > 0) throw new SetupFailure('database', `The database server lacks ${refused.join('; ')}.`);
    for (const role of loginRoles) await ensureLoginRole(client, role, rolePassword(options.secret, role));
    return { ...roleAddresses(options), noted };
  } finally {
    await client.end();
  }
}

/** The addresses under which the program's roles log in to the database of the administrator's address. */
export function roleAddresses(options: { adminUrl: string; secret: string }): DatabaseAddresses {
  const addressOf = (role: LoginRole) => {
    const url = new URL(options.adminUrl);
    url.username = role;
    url.password = rolePassword(options.secret, role);
    return url.href;
  };
  return { appUrl: addressOf('fascicle_app'), feedUrl: addressOf('fascicle_feed'), auditUrl: addressOf('fascicle_audit'), migrateUrl: addressOf('fascicle_migrate') };
}

async function ensureLoginRole(client: Client, role: LoginRole, password: string): Promise<void> {
  const verifier = client.escapeLiteral(scramVerifier(password));
  const exists = (await client.query('select 1 from pg_roles where rolname = $1', [role])).rowCount === 1;
  try {
    await client.query(`${exists ? 'alter' : 'create'} role ${role} with login password ${verifier}`);
  } catch (error) {
    const reason = hasCode(error) ? error.message : String(error);
    throw new SetupFailure('missingRight', `The database user may not ${exists ? 'change' : 'create'} the role ${role}: ${reason}.`, error);
  }
}
