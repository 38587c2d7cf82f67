import type { IncomingMessage } from 'node:http';

import { isLoopback } from '@/server/settings/is-loopback';

/**
 * The address a request came from, for throttling. Behind the https proxy on this machine it is the last address that
 * the proxy itself added; whatever a client writes before that is not believed.
 */
export function clientAddress(request: IncomingMessage, publicUrl: string): string {
  const peer = (request.socket.remoteAddress ?? 'unknown').replace(/^::ffff:/, '');
  if (!publicUrl.startsWith('https:') || !isLoopback(peer)) return peer;
  const forwarded = String(request.headers['x-forwarded-for'] ?? '').split(',').at(-1)?.trim();
  return forwarded === undefined || !/^[0-9a-f:.]{3,45}$/i.test(forwarded) ? peer : forwarded;
}
