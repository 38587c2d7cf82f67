import { isLoopback } from '@/server/settings/is-loopback';

/** The origins and hosts that this server answers to. */
export interface AllowedOrigins {
  readonly origins: ReadonlySet<string>;
  readonly hosts: ReadonlySet<string>;
}

/** The public address, and on a loopback-only server its other loopback names: a person may type either. */
export function allowedOrigins(publicUrl: string, port: number): AllowedOrigins {
  const origins = new Set([new URL(publicUrl).origin]);
  if (isLoopback(new URL(publicUrl).hostname)) {
    for (const name of ['127.0.0.1', 'localhost', '[::1]']) origins.add(new URL(`http://${name}:${port}`).origin);
  }
  return { origins, hosts: new Set([...origins].map((origin) => new URL(origin).host)) };
}
