import knex, { type Knex } from 'knex';
import { columnTypes } from './column-types';

/** A pool or a transaction: the first argument of everything that reads or writes. */
export type Handle = Knex;

/** One address per login role. */
export interface DatabaseUrls {
  readonly app: string;
  readonly feed: string;
  readonly audit: string;
}

/** One pool per login role; each can do only what its role may. */
export interface Database {
  readonly app: Knex;
  readonly feed: Knex;
  readonly audit: Knex;
  close(): Promise<void>;
}

const STATEMENT_TIMEOUT_MS = 5000;
/** The server's own limit cannot fire when the server is stopped; then this one ends the wait. */
const QUERY_TIMEOUT_MS = 6000;
const CONNECT_TIMEOUT_MS = 3000;

/** Every failure reaches the caller, who says it once; knex would print it a second time. */
const silent = { warn: () => undefined, error: () => undefined, deprecate: () => undefined, debug: () => undefined };

/** A pool for one role. Opens no connection before the first query. */
export function makePool(url: string, max: number, name: string): Knex {
  return knex({
    client: 'pg',
    log: silent,
    connection: {
      connectionString: url,
      application_name: name,
      types: columnTypes,
      statement_timeout: STATEMENT_TIMEOUT_MS,
      query_timeout: QUERY_TIMEOUT_MS,
      idle_in_transaction_session_timeout: 2 * STATEMENT_TIMEOUT_MS,
      connectionTimeoutMillis: CONNECT_TIMEOUT_MS,
      keepAlive: true,
    },
    pool: { min: 0, max },
    acquireConnectionTimeout: STATEMENT_TIMEOUT_MS,
  });
}

/** The pools of the serving program: people's reads and all writes, the feed of walls and timers, the audit of reads. */
export function makeDatabase(urls: DatabaseUrls): Database {
  const app = makePool(urls.app, 10, 'fascicle app');
  const feed = makePool(urls.feed, 4, 'fascicle feed');
  const audit = makePool(urls.audit, 2, 'fascicle audit');
  return {
    app,
    feed,
    audit,
    async close() {
      await Promise.all([app.destroy(), feed.destroy(), audit.destroy()]);
    },
  };
}
