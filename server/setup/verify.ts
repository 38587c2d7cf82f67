import { makePool } from '@/db/connection';
import { settings } from '@/server/settings/settings';
import { exitStatuses } from './exit-statuses.mjs';
import { openInstallation } from './installation';
import { readEnvironmentFile } from './read-environment-file.mjs';
import { reportFailure, SetupFailure } from './setup-failure.mjs';
import { readVerifyRequest, verifyRecords } from './verify-records';

const NOT_VERIFIED = 1;

/** `npm run verify -- --case ID | --all`: ends with 0 only when every record passed. Reads as the feed, which cannot write. */
async function verify(words: readonly string[]): Promise<number> {
  const request = readVerifyRequest(words);
  if (request.kind === 'wrong') {
    console.error(request.sentence);
    return exitStatuses.wrongSetting;
  }
  readEnvironmentFile();
  const feed = makePool(openInstallation(settings()).feedUrl, 1, 'fascicle verify');
  try {
    return (await verifyRecords(feed, request.caseId, (line) => console.log(line))) ? 0 : NOT_VERIFIED;
  } catch (error) {
    throw new SetupFailure('database', `The records could not be read: ${error instanceof Error ? error.message : String(error)}.`, error);
  } finally {
    await feed.destroy();
  }
}

try {
  process.exitCode = await verify(process.argv.slice(2));
} catch (error) {
  process.exitCode = reportFailure(error);
}
