import { createServer } from 'node:http';
import { encode } from 'next-auth/jwt';

import { makePool, type Handle } from '@/db/connection';
import { findCredentialsByEmail } from '@/db/repositories/people/find-credentials-by-email';
import { DEMO_PASSWORD } from '@/db/seeds/demo-people';
import { deriveSecret } from '@/server/auth/derive-secret';
import { nextCode } from '@/server/auth/second-factor';
import type { FascicleGlobal } from '@/server/fascicle-global';
import { allowedOrigins } from '@/server/http/allowed-origins';
import { serveRequests } from '@/server/http/serve-requests';
import { chooseFreePort } from '@/server/setup/free-port';
import { startHouse } from '@/server/start-house';
import { createLogger } from '@/server/telemetry/create-logger';
import { createTestDatabase, type TestDatabase } from '@/tests/support/database';

import { serveRoutes } from './serve-routes';

/** A server without pages, on a database and a port of its own. */
export interface TestHouse {
  readonly url: string;
  readonly database: TestDatabase;
  /** Connected as the administrator, who sees every row. */
  readonly admin: Handle;
  /** Signs a demo person in, once per house: a code is good once. */
  cookieOf(email: string): Promise<string>;
  sessionIdOf(email: string): Promise<string>;
  close(): Promise<void>;
}

/** Opens a house. Lines of its log are kept and can be looked at. */
export async function openTestHouse(options: { database?: TestDatabase; logLines?: string[] } = {}): Promise<TestHouse> {
  const database = options.database ?? (await createTestDatabase('demo'));
  const port = await chooseFreePort();
  const url = `http://127.0.0.1:${port}`;
  const log = createLogger({ level: 'info', destination: { write: (line: string) => void options.logLines?.push(line) } });
  const httpServer = createServer();
  const allowed = allowedOrigins(url, port);
  const settings = { publicUrl: url, secret: database.secret, demo: true, databaseUrlApp: database.appUrl, databaseUrlFeed: database.feedUrl, databaseUrlAudit: database.auditUrl };
  const house = startHouse({ settings, log, httpServer, allowed });
  const before = globalThis.fascicle as FascicleGlobal | undefined;
  globalThis.fascicle = house.fascicle;
  httpServer.on('request', serveRequests({ allowed, publicUrl: url, isDevelopment: false, log, handle: serveRoutes }));
  await new Promise<void>((resolve) => httpServer.listen(port, '127.0.0.1', resolve));
  const admin = makePool(database.adminUrl, 2, 'fascicle test');
  const sessions = new Map<string, Promise<string>>();

  async function signIn(email: string): Promise<string> {
    const credentials = await findCredentialsByEmail(admin, email);
    if (credentials === null) throw new Error(`There is no demo person ${email}.`);
    const { code } = await nextCode(credentials.secondFactorSecret, credentials.secondFactorStep, Date.now());
    const signedIn = await house.fascicle.execute('sign-in', { email, password: DEMO_PASSWORD, code }, { cookie: null, authorization: null, address: '127.0.0.1' });
    if (!signedIn.isOk) throw new Error(signedIn.body.message);
    return signedIn.body.sessionId;
  }
  const sessionIdOf = (email: string) => {
    const session = sessions.get(email) ?? signIn(email);
    sessions.set(email, session);
    return session;
  };
  return {
    url,
    database,
    admin,
    sessionIdOf,
    cookieOf: async (email) => sessionCookie(await sessionIdOf(email), database.secret),
    async close() {
      if (before !== undefined) globalThis.fascicle = before;
      await house.stop();
      await admin.destroy();
      if (options.database === undefined) await database.drop();
    },
  };
}

/** The cookie that next-auth would set for a session. */
export async function sessionCookie(sessionId: string, secret: string): Promise<string> {
  const token = await encode({ token: { sessionId }, secret: deriveSecret(secret, 'session-token') });
  return `next-auth.session-token=${token}`;
}
