import { makePool } from '@/db/connection';
import { findCredentialsByEmail } from '@/db/repositories/people/find-credentials-by-email';
import { nextCode } from '@/server/auth/second-factor';
import { settings } from '@/server/settings/settings';
import { openInstallation } from '@/server/setup/installation';
import { readEnvironmentFile } from '@/server/setup/read-environment-file.mjs';
import { reportFailure, SetupFailure } from '@/server/setup/setup-failure.mjs';

/** `npm run code -- --for EMAIL`: the present code of a demo person. Nobody else's code can be printed. */
async function printCode(words: readonly string[]): Promise<void> {
  const at = words.indexOf('--for');
  const email = at < 0 ? undefined : words[at + 1];
  if (email === undefined) throw new SetupFailure('wrongSetting', 'Whose code? Type: npm run code -- --for desk@demo.example');
  const parsed = settings();
  if (!parsed.demo) throw new SetupFailure('wrongSetting', 'Demo mode is off; codes are printed for demo people only.');
  const pool = makePool(openInstallation(parsed).appUrl, 1, 'fascicle code');
  try {
    const credentials = await findCredentialsByEmail(pool, email);
    if (credentials === null || !credentials.isDemo) throw new SetupFailure('wrongSetting', `There is no demo person with the e-mail "${email}".`);
    const { code, secondsLeft } = await nextCode(credentials.secondFactorSecret, credentials.secondFactorStep, Date.now());
    process.stdout.write(`${code} for ${credentials.email}, taken for ${secondsLeft} s more\n`);
  } finally {
    await pool.destroy();
  }
}

try {
  readEnvironmentFile();
  await printCode(process.argv.slice(2));
} catch (error) {
  process.exitCode = reportFailure(error);
}
