import { isLoopback } from './is-loopback';
import { parseEnvironment, type Environment } from './parse-environment';
import { SettingsFailure } from './settings-failure';
import { settingsSchema } from './settings-schema';

export type Settings = Readonly<{
  host: string;
  port: number;
  /** The origin that browsers use; the only one requests are accepted from. */
  publicUrl: string;
  databaseUrl: string | null;
  demo: boolean;
  stateFolder: string | null;
  secret: string | null;
  logLevel: 'fatal' | 'error' | 'warn' | 'info' | 'debug' | 'trace' | 'silent';
}>;

/** The environment as settings. Throws SettingsFailure with one sentence when they cannot be used together. */
export function parseSettings(environment: Environment): Settings {
  const read = parseEnvironment(settingsSchema, environment);
  const host = read.HOST ?? '127.0.0.1';
  const port = read.PORT ?? 4050;
  const publicUrl = new URL(read.PUBLIC_URL ?? `http://${host.includes(':') ? `[${host.replace(/[[\]]/g, '')}]` : host}:${port}`).origin;
  assertEncrypted(host, publicUrl);
  const reachedFromHereOnly = isLoopback(host) && isLoopback(new URL(publicUrl).hostname);
  if (read.FASCICLE_DEMO === true) assertDemoIsHarmless(read.DATABASE_URL !== undefined, reachedFromHereOnly, publicUrl);
  return {
    host,
    port,
    publicUrl,
    databaseUrl: read.DATABASE_URL ?? null,
    demo: read.FASCICLE_DEMO ?? (read.DATABASE_URL === undefined && reachedFromHereOnly),
    stateFolder: read.FASCICLE_STATE_FOLDER ?? null,
    secret: read.FASCICLE_SECRET ?? null,
    logLevel: read.LOG_LEVEL ?? 'info',
  };
}

function assertEncrypted(host: string, publicUrl: string): void {
  const url = new URL(publicUrl);
  if (url.protocol === 'https:') return;
  if (!isLoopback(host)) {
    throw new SettingsFailure(`HOST is "${host}", which other machines can reach, and PUBLIC_URL is "${publicUrl}"; set PUBLIC_URL to the https address of the proxy in front, or HOST to 127.0.0.1.`);
  }
  if (!isLoopback(url.hostname)) {
    throw new SettingsFailure(`PUBLIC_URL is "${publicUrl}"; an address that other machines reach must begin with https://.`);
  }
}

function assertDemoIsHarmless(hasDatabase: boolean, reachedFromHereOnly: boolean, publicUrl: string): void {
  if (hasDatabase) throw new SettingsFailure('FASCICLE_DEMO is on and DATABASE_URL is set; demo people are never written into a database of yours, so unset one of the two.');
  if (!reachedFromHereOnly) throw new SettingsFailure(`FASCICLE_DEMO is on and PUBLIC_URL is "${publicUrl}"; demo passwords are known to everybody, so the demo runs on a loopback address only.`);
}

let parsed: Settings | null = null;

/** The settings of this program, parsed at the first call: importing this file reads nothing, so a build needs no environment. */
export function settings(): Settings {
  parsed ??= parseSettings(process.env);
  return parsed;
}
