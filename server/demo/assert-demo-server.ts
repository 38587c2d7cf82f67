import { SetupFailure } from '@/server/setup/setup-failure.mjs';
import { isLoopback } from '@/server/settings/is-loopback';

/** Lets the demo go on only at a demo on this machine: invented cases never enter another database. */
export async function assertDemoServer(url: string, reach: typeof fetch = fetch): Promise<void> {
  if (!isLoopback(new URL(url).hostname)) {
    throw new SetupFailure('wrongSetting', `--url is "${url}", which is not on this machine; a demo is played on a loopback address only, such as http://127.0.0.1:4050.`);
  }
  const response = await answerOf(url, reach);
  if (response === null) throw new SetupFailure('wrongSetting', `Nothing answers at ${url}; start the server with "npm start" in another window first.`);
  if (response.status === 200) return;
  if (response.status === 404) throw new SetupFailure('wrongSetting', `The server at ${url} is not in demo mode; invented cases are played in a demo only.`);
  throw new SetupFailure('unexpected', `The server at ${url} answered ${response.status} when it was asked whether it is a demo; look into its log.`);
}

/** The demo people are offered in demo mode only. */
async function answerOf(url: string, reach: typeof fetch): Promise<Response | null> {
  try {
    return await reach(`${url}/api/demo-people`, { redirect: 'manual', signal: AbortSignal.timeout(10_000) });
  } catch {
    return null;
  }
}
