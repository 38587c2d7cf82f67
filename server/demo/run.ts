import path from 'node:path';

import { assertDemoServer } from '@/server/demo/assert-demo-server';
import { demoList } from '@/server/demo/demo-words';
import { DemoTokens } from '@/server/demo/demo-tokens';
import { demoWish } from '@/server/demo/demo-wish';
import { playDemo } from '@/server/demo/play-demo';
import { settings } from '@/server/settings/settings';
import { readEnvironmentFile } from '@/server/setup/read-environment-file.mjs';
import { readRunning } from '@/server/setup/running-record.mjs';
import { chooseStateFolder } from '@/server/setup/state-folder.mjs';

const root = path.resolve(import.meta.dirname, '../..');
const print = (line: string) => void process.stdout.write(`${line}\n`);

/** `npm run demo`: plays an invented case on the running demo server, through its public interface alone. */
export async function run(words: readonly string[], stop: AbortSignal): Promise<number> {
  readEnvironmentFile();
  const { scenario, speed, url: wished, isList } = demoWish(words);
  if (isList) {
    print(demoList());
    return 0;
  }
  const url = wished ?? runningAddress();
  await assertDemoServer(url);
  const tokens = new DemoTokens(root);
  try {
    const [desk, physician] = [await tokens.credentialsFor('desk@demo.example'), await tokens.credentialsFor('physician@demo.example')];
    if (!stop.aborted) await playDemo({ url, people: { desk, physician }, scenario, speed, stop, print });
    return 0;
  } finally {
    await tokens.revoke();
  }
}

/** Where `npm start` of this clone serves; when it says nothing, where it would. */
function runningAddress(): string {
  const { stateFolder, publicUrl } = settings();
  return readRunning(chooseStateFolder(root, { wish: stateFolder ?? undefined }))?.url ?? publicUrl;
}
