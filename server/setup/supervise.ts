import { setTimeout as pause } from 'node:timers/promises';
import type { Cluster } from './database/cluster';
import { createRestartLimit } from './restart-limit';
import type { ServingProgram } from './serving-program';
import { SetupFailure } from './setup-failure.mjs';

export type Supervised = {
  stop: AbortSignal;
  /** Null with a database server of the owner's: that one is not ours to start or stop. */
  cluster: Cluster | null;
  restartCluster: () => Promise<Cluster>;
  startServer: (cluster: Cluster | null) => Promise<ServingProgram>;
  onFirstListening: (serving: ServingProgram) => void;
  say: (sentence: string) => void;
};

const lookEveryMs = 50;

/** Keeps the database and the server running until it is told to stop; then stops the server first. */
export async function supervise(order: Supervised): Promise<void> {
  const failed = new AbortController();
  const over = AbortSignal.any([order.stop, failed.signal]);
  const now: { cluster: Cluster | null; serving: ServingProgram | null } = { cluster: order.cluster, serving: null };
  const guard = (work: Promise<void>) => work.catch((error: unknown) => failed.abort(error));
  try {
    await Promise.all([guard(keepCluster(order, now, over)), guard(keepServer(order, now, over))]);
  } finally {
    await now.serving?.stop();
    await now.cluster?.stop();
  }
  if (failed.signal.aborted && !order.stop.aborted) throw failed.signal.reason;
}

type Now = { cluster: Cluster | null; serving: ServingProgram | null };

async function keepCluster(order: Supervised, now: Now, over: AbortSignal): Promise<void> {
  const limit = createRestartLimit();
  while (now.cluster !== null && !over.aborted) {
    const begin = performance.now();
    while (now.cluster.isRunning() && !over.aborted) await pause(lookEveryMs);
    if (over.aborted) return;
    const delayMs = limit.nextDelayMs(performance.now() - begin);
    if (delayMs === null) throw new SetupFailure('database', 'The private database ends again and again right after its start; its log is in the state folder.');
    await pause(delayMs);
    const portBefore = now.cluster.port;
    now.cluster = await order.restartCluster();
    order.say('The database had ended unexpectedly and was started again.');
    // The server was told another address; it is started again with the right one.
    if (now.cluster.port !== portBefore) await now.serving?.stop();
  }
}

async function keepServer(order: Supervised, now: Now, over: AbortSignal): Promise<void> {
  const limit = createRestartLimit();
  const stopped = new Promise<null>((tell) => over.addEventListener('abort', () => tell(null), { once: true }));
  for (let isFirst = true; !over.aborted; isFirst = false) {
    while (now.cluster?.isRunning() === false && !over.aborted) await pause(lookEveryMs);
    if (over.aborted) return;
    const serving = await order.startServer(now.cluster).catch((error: unknown) => (isFirst || isPortTaken(error) ? Promise.reject(error) : null));
    now.serving = serving;
    if (isFirst && serving !== null && !over.aborted) order.onFirstListening(serving);
    const begin = performance.now();
    const reason = serving === null ? 'it did not listen' : await Promise.race([serving.ended, stopped]);
    if (reason === null) return;
    const delayMs = limit.nextDelayMs(serving === null ? 0 : performance.now() - begin);
    if (delayMs === null) throw new SetupFailure('serverKeepsFailing', `The server ends again and again right after its start (${reason}); its log is in the state folder.`);
    order.say(`The server had ended unexpectedly (${reason}) and is started again.`);
    await pause(delayMs);
  }
}

function isPortTaken(error: unknown): boolean {
  return error instanceof SetupFailure && error.reason === 'takenPort';
}
