import { EventEmitter } from 'node:events';
import { createServer, type Server as HttpServer } from 'node:http';
import next from 'next';

import { startHouse } from '@/server/start-house';
import { allowedOrigins } from '@/server/http/allowed-origins';
import { serveRequests } from '@/server/http/serve-requests';
import { deriveSecret } from '@/server/auth/derive-secret';
import { serverSettings, type ServerSettings } from '@/server/settings/server-settings';
import { exitStatuses } from '@/server/setup/exit-statuses.mjs';
import { createLogger } from '@/server/telemetry/create-logger';

const isDevelopment = process.env.NODE_ENV !== 'production';

/** The composition root: settings, database, commands, live channel, pages, one port. */
async function main(): Promise<void> {
  const settings = serverSettings();
  const log = createLogger({ level: settings.logLevel });
  // A fault that nobody caught is written down; one request is lost, every wall stays.
  process.on('uncaughtException', (cause) => log.error({ err: cause }, 'A fault was caught by nobody.'));
  process.on('unhandledRejection', (cause) => log.error({ err: cause }, 'A promise failed and nobody listened.'));
  giveSignInItsSettings(settings);
  const allowed = allowedOrigins(settings.publicUrl, settings.port);
  const httpServer = createServer({ requestTimeout: 30_000, headersTimeout: 10_000, maxHeaderSize: 16_384 });
  const house = startHouse({ settings, log, httpServer, allowed });
  globalThis.fascicle = house.fascicle;

  // Next registers its own 'upgrade' listener; it gets a stand-in, so that this server answers each path in one way.
  const nextUpgrades = new EventEmitter();
  const pages = next({ dev: isDevelopment, dir: process.cwd(), hostname: settings.host, port: settings.port, httpServer: nextUpgrades as unknown as HttpServer });
  await pages.prepare();
  httpServer.on('request', serveRequests({ allowed, publicUrl: settings.publicUrl, isDevelopment, log, handle: pages.getRequestHandler() }));
  httpServer.on('upgrade', (request, socket, head) => {
    const path = (request.url ?? '').split('?')[0] ?? '';
    if (path.startsWith('/socket.io')) return;
    if (isDevelopment && path.startsWith('/_next/') && nextUpgrades.emit('upgrade', request, socket, head)) return;
    socket.end('HTTP/1.1 404 Not Found\r\nConnection: close\r\n\r\n');
  });
  await listen(httpServer, settings);
  log.info({ port: settings.port, host: settings.host }, 'Listening.');
  process.send?.({ kind: 'listening', port: settings.port });

  let isStopping = false;
  const stop = (): void => {
    if (isStopping) return;
    isStopping = true;
    setTimeout(() => process.exit(1), 10_000).unref();
    house
      .stop()
      .then(() => pages.close())
      .catch((cause: unknown) => log.error({ err: cause }, 'The stop was not clean.'))
      .finally(() => process.exit(0));
  };
  for (const signal of ['SIGTERM', 'SIGINT'] as const) process.on(signal, stop);
}

/** next-auth reads its address and key from the environment; both follow from ours. */
function giveSignInItsSettings(settings: ServerSettings): void {
  process.env.NEXTAUTH_URL = settings.publicUrl;
  process.env.NEXTAUTH_SECRET = deriveSecret(settings.secret, 'session-token');
}

function listen(httpServer: HttpServer, { host, port }: ServerSettings): Promise<void> {
  return new Promise((resolve, reject) => {
    httpServer.once('error', reject);
    httpServer.listen(port, host.replace(/[[\]]/g, ''), () => {
      httpServer.off('error', reject);
      resolve();
    });
  });
}

main().catch((cause: unknown) => {
  const code = cause instanceof Error && 'code' in cause ? cause.code : null;
  const isTaken = code === 'EADDRINUSE';
  const sentence = isTaken ? `Port ${process.env.PORT ?? ''} is taken by another program.` : cause instanceof Error ? cause.message : String(cause);
  process.stderr.write(`${sentence}\n`);
  const isSetting = cause instanceof Error && 'kind' in cause && cause.kind === 'settings';
  process.exit(isTaken ? exitStatuses.takenPort : isSetting ? exitStatuses.wrongSetting : exitStatuses.unexpected);
});
