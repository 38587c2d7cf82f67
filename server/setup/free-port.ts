import { createServer } from 'node:net';
import { randomInt } from 'node:crypto';

/** Below the range that Linux lends to outgoing connections, so that a stopped server finds its port free again. */
const firstPort = 20_000;
const lastPort = 32_000;

/** Why a port cannot be listened on, or null when it can. */
export function whyPortIsTaken(host: string, port: number): Promise<string | null> {
  return new Promise((resolve) => {
    const probe = createServer();
    probe.once('error', (error: NodeJS.ErrnoException) => resolve(error.code ?? error.message));
    probe.listen({ host, port, exclusive: true }, () => probe.close(() => resolve(null)));
  });
}

export async function chooseFreePort(host = '127.0.0.1'): Promise<number> {
  for (let attempt = 0; attempt < 200; attempt += 1) {
    const port = randomInt(firstPort, lastPort);
    if ((await whyPortIsTaken(host, port)) === null) return port;
  }
  throw new Error(`No port from ${firstPort} to ${lastPort} on ${host} is free.`);
}
