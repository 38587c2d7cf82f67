import { z } from 'zod';
import { parseEnvironment, type Environment } from './parse-environment';
import { parseSettings, type Settings } from './settings';

const roleAddress = z.string('the address of a database role; start the program by "npm start", which sets it').min(1, 'the address of a database role');

const serverSchema = z.object({
  DATABASE_URL_APP: roleAddress,
  DATABASE_URL_FEED: roleAddress,
  DATABASE_URL_AUDIT: roleAddress,
  FASCICLE_SECRET: z.string('at least 32 characters; start the program by "npm start", which makes one').min(32, 'at least 32 characters'),
});

export type ServerSettings = Settings & Readonly<{ secret: string; databaseUrlApp: string; databaseUrlFeed: string; databaseUrlAudit: string }>;

/** What the serving program needs on top of the settings: one address per database role and the secret. */
export function parseServerSettings(environment: Environment): ServerSettings {
  const read = parseEnvironment(serverSchema, environment);
  return {
    ...parseSettings(environment),
    secret: read.FASCICLE_SECRET,
    databaseUrlApp: read.DATABASE_URL_APP,
    databaseUrlFeed: read.DATABASE_URL_FEED,
    databaseUrlAudit: read.DATABASE_URL_AUDIT,
  };
}

let parsed: ServerSettings | null = null;

/** The serving program's settings, parsed at the first call and never at import. */
export function serverSettings(): ServerSettings {
  parsed ??= parseServerSettings(process.env);
  return parsed;
}
