import { mkdirSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { pathToFileURL } from 'node:url';

import { generateApi } from 'swagger-typescript-api';

/** What the interface answered, right or wrong. */
export interface MachineReply {
  readonly status: number;
  readonly body: unknown;
}

/** One call for each operation of the description, by its operationId: path words first, then query or body. */
export type MachineClient = Readonly<Record<string, (...words: readonly unknown[]) => Promise<MachineReply>>>;

type MadeCalls = Readonly<Record<string, (...words: readonly unknown[]) => Promise<Response & { 'data': unknown; error: unknown }>>>;
type MadeModule = { readonly Api: new (config: object) => { readonly api: MadeCalls } };

const folder = path.resolve(import.meta.dirname, '../../.out/machine-client');

/** Makes a client from an interface's description and nothing else, as somebody outside would. */
export async function makeClient(description: object, access: { readonly url: string; readonly token: string }): Promise<MachineClient> {
  const made = await generateApi({ output: false, spec: structuredClone(description) as never, httpClientType: 'fetch', silent: true });
  const { api } = new (await importOnce(made.files.map(({ fileContent }) => fileContent).join('\n'))).Api({
    baseUrl: access.url,
    baseApiParams: { secure: true, credentials: 'omit' },
    securityWorker: () => ({ headers: { authorization: `Bearer ${access.token}` } }),
  });
  const calls = Object.entries(api).map(([name, call]) => {
    const answer = async (...words: readonly unknown[]): Promise<MachineReply> => {
      const reply = await call(...words).catch((failed: unknown) => failed);
      // A made client throws the answer when it is no 2xx; anything else that it throws is a fault of its own.
      if (!(reply instanceof Response)) throw reply;
      const read = reply as Awaited<ReturnType<typeof call>>;
      return { status: read.status, body: read.data ?? read.error };
    };
    return [name, answer] as const;
  });
  return Object.fromEntries(calls);
}

async function importOnce(source: string): Promise<MadeModule> {
  mkdirSync(folder, { recursive: true });
  const file = path.join(folder, `client-${process.pid}-${process.hrtime.bigint()}.ts`);
  writeFileSync(file, source);
  const imported = (await import(pathToFileURL(file).href)) as MadeModule;
  rmSync(file);
  return imported;
}
