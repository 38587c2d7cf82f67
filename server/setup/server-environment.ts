import type { Settings } from '@/server/settings/settings';
import type { DatabaseAddresses } from './database/prepare-database';

/** The serving program's environment: what it needs and no administrator's address. */
export function serverEnvironment(settings: Settings, secret: string, addresses: DatabaseAddresses): NodeJS.ProcessEnv {
  const { DATABASE_URL: _administrator, DATABASE_URL_ADMIN: _migrations, ...inherited } = process.env;
  return {
    ...inherited,
    NODE_ENV: 'production',
    NEXT_TELEMETRY_DISABLED: '1',
    HOST: settings.host,
    PORT: String(settings.port),
    PUBLIC_URL: settings.publicUrl,
    FASCICLE_DEMO: settings.demo ? 'on' : 'off',
    FASCICLE_SECRET: secret,
    LOG_LEVEL: settings.logLevel,
    DATABASE_URL_APP: addresses.appUrl,
    DATABASE_URL_FEED: addresses.feedUrl,
    DATABASE_URL_AUDIT: addresses.auditUrl,
  };
}
