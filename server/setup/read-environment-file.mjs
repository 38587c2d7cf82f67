import { existsSync } from 'node:fs';

/** Reads `.env` of the clone; what stands in the environment already wins. */
export function readEnvironmentFile() {
  if (existsSync('.env')) process.loadEnvFile('.env');
}
