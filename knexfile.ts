import path from 'node:path';
import type { Knex } from 'knex';

/** For the migrations only; the serving program has its own pools. `npm start` gives the administrator's address. */
const knexConfig: Knex.Config = {
  client: 'pg',
  connection: process.env.DATABASE_URL_ADMIN ?? '',
  pool: { min: 0, max: 1 },
  migrations: { directory: path.resolve(import.meta.dirname, 'db/migrations'), extension: 'ts', loadExtensions: ['.ts'] },
};

export default knexConfig;
