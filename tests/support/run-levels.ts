import { SetupFailure } from '@/server/setup/setup-failure.mjs';
import { duration, step } from '@/server/setup/step.mjs';
import { ensureChromium } from './chromium';
import { buildForTests } from './product-build';
import { openRunFolder } from './run-folder';
import { addTallies, exitStatusOf, nothing, tallySentence, type Tally } from './tally';
import { programLevel, vitestLevel, workLevel, type TestLevel } from './test-level';
import { startThrowawayCluster, type ThrowawayCluster } from './throwaway-cluster';

/** From what is quick and near the source to what is slow and near the user. */
const levels: readonly TestLevel[] = [
  programLevel('types', [['node_modules/next/dist/bin/next', 'typegen'], ['node_modules/typescript/bin/tsc', '--noEmit', '-p', '.']]),
  programLevel('lint', [['node_modules/eslint/bin/eslint.js', '--config', 'tests/architecture/eslint.config.mjs', '--max-warnings', '0', '.']]),
  programLevel('arrows', [['node_modules/dependency-cruiser/bin/dependency-cruise.mjs', '--config', 'tests/architecture/dependency-cruiser.cjs', 'app', 'server', 'lib', 'db']]),
  ...['architecture', 'lib', 'reference', 'app', 'db', 'server'].map(vitestLevel),
  workLevel('build', () => buildForTests({ fromNothing: true })),
  ...['live', 'faults', 'e2e'].map(vitestLevel),
];
const withoutDatabase = new Set(['types', 'lint', 'arrows', 'architecture', 'lib', 'reference', 'app', 'build']);

/** Runs the levels that are wanted (all when none is named) and gives the exit status. */
export async function runLevels(options: { only: readonly string[]; full: boolean; stop: AbortSignal }): Promise<number> {
  const unknown = options.only.filter((name) => !levels.some((level) => level.name === name));
  if (unknown.length > 0) throw new SetupFailure('wrongSetting', `There is no level "${unknown[0]}"; there are ${levels.map(({ name }) => name).join(', ')}.`);
  const wanted = levels.filter(({ name }) => options.only.length === 0 || options.only.includes(name));
  if (options.full) process.env.FASCICLE_TEST_FULL = '1';
  if (wanted.some(({ name }) => name === 'e2e' || name === 'live' || name === 'faults')) await step('Chromium', ensureChromium);
  const runFolder = openRunFolder();
  const cluster: { own: ThrowawayCluster | null } = { own: null };
  try {
    if (wanted.some(({ name }) => !withoutDatabase.has(name))) {
      await step('database', async () => void (cluster.own = await startThrowawayCluster()));
      process.env.FASCICLE_TEST_ADMIN_URL = cluster.own?.adminUrl ?? '';
    }
    const tally = await runEach(wanted, options.stop);
    if (options.stop.aborted) throw new SetupFailure('unexpected', 'The tests were stopped before their end.');
    process.stdout.write(`\n${tallySentence(tally)}\n`);
    return exitStatusOf(tally);
  } finally {
    await cluster.own?.remove();
    await runFolder.remove();
  }
}

async function runEach(wanted: readonly TestLevel[], stop: AbortSignal): Promise<Tally> {
  const lines: string[] = [];
  let sum = nothing;
  for (const level of wanted) {
    if (stop.aborted) break;
    process.stdout.write(`\n── ${level.name}\n`);
    const begin = performance.now();
    const tally = await level.run();
    lines.push(`  ${level.name.padEnd(12)} ${duration(performance.now() - begin).padStart(8)}  ${tallySentence(tally)}`);
    process.stdout.write(`${lines.at(-1)}\n`);
    sum = addTallies([sum, tally]);
  }
  process.stdout.write(`\nLevels\n${lines.join('\n')}\n`);
  return sum;
}
