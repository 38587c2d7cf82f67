import { createWriteStream, mkdirSync } from 'node:fs';
import path from 'node:path';
import { parseSettings } from '@/server/settings/settings';
import { buildEnvironment } from '@/server/setup/build-folders';
import { chooseFreePort } from '@/server/setup/free-port';
import { serverEnvironment } from '@/server/setup/server-environment';
import type { ServerLog } from '@/server/setup/server-log';
import { startServing, type ServingProgram } from '@/server/setup/serving-program';
import { endProgram } from '@/server/setup/started-program.mjs';
import { createTestDatabase, type TestDatabase } from './database';
import { root, testBuildFolders } from './product-build';
import { makeTemplates, type TemplateKind } from './template-database';
import { startThrowawayCluster, type ThrowawayCluster } from './throwaway-cluster';

export type ProductOptions = Readonly<{
  /** `demo` (the default) has the demo people in it and demo mode on. */
  kind?: TemplateKind;
  /** A PostgreSQL for this product alone, which the test may then stop and kill. */
  ownCluster?: boolean;
  /** Set to run a second server on another product's database. */
  database?: TestDatabase;
  port?: number;
  environment?: Readonly<Record<string, string>>;
}>;

export type Product = Readonly<{
  url: string;
  port: number;
  database: TestDatabase;
  /** Null without `ownCluster`. */
  cluster: ThrowawayCluster | null;
  /** Real numbers of the running programs, for a real kill -9. */
  pid: () => number;
  databasePid: () => number | null;
  kill9: () => Promise<void>;
  /** Starts the server again on the same port and database, after `kill9` or `stopServer`. */
  restart: () => Promise<void>;
  stopServer: () => Promise<void>;
  /** Stops everything and removes the database. */
  stop: () => Promise<void>;
}>;

/** Starts the production build on a database and a port of its own. */
export async function startProduct(options: ProductOptions = {}): Promise<Product> {
  const cluster = options.ownCluster === true ? await startThrowawayCluster() : null;
  if (cluster !== null) await makeTemplates(cluster.adminUrl);
  const database = options.database ?? (await createTestDatabase(options.kind ?? 'demo', cluster?.adminUrl));
  const port = options.port ?? (await chooseFreePort());
  const start = () => startServing({ command: [process.execPath, '--enable-source-maps', testBuildFolders.serverFile], cwd: root, environment: environmentOf(options, database, port), log: testLog(port) });
  let serving: ServingProgram = await start();
  return {
    url: `http://127.0.0.1:${port}`,
    port,
    database,
    cluster,
    pid: () => serving.program.pid,
    databasePid: () => cluster?.cluster().pid ?? null,
    kill9: () => endProgram(serving.program, { signal: 'SIGKILL' }),
    restart: async () => {
      serving = await start();
    },
    stopServer: () => serving.stop(),
    stop: async () => {
      await serving.stop();
      if (cluster !== null) await cluster.remove();
      else if (options.database === undefined) await database.drop();
    },
  };
}

function environmentOf(options: ProductOptions, database: TestDatabase, port: number): NodeJS.ProcessEnv {
  const settings = parseSettings({ PORT: String(port), FASCICLE_DEMO: options.kind === 'empty' ? 'off' : 'on', LOG_LEVEL: 'info' });
  return { ...serverEnvironment(settings, database.secret, database), ...buildEnvironment(testBuildFolders), ...options.environment };
}

/** All that the server says, kept for whoever looks into a failed test. */
function testLog(port: number): ServerLog {
  const folder = path.join(root, 'tests/.out/logs');
  mkdirSync(folder, { recursive: true });
  const file = createWriteStream(path.join(folder, `server-${port}.log`), { flags: 'a' });
  return { follow: (output) => void output.pipe(file, { end: false }) };
}
