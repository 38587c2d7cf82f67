/* npm run bench [-- NAME…] [-- --seed=N]: measures on the production build, each beside a bare baseline in the same run. */
import os from 'node:os';

import { launchChromium } from '@/tests/support/chromium';
import { buildForTests } from '@/tests/support/product-build';
import { startProduct } from '@/tests/support/start-product';

import { keyToWallPaint } from './key-to-wall-paint';
import { serverCommand } from './server-command';
import { writeResults } from './write-result';

const measures = [keyToWallPaint, serverCommand];
const words = process.argv.slice(2);
const seed = Number(words.find((word) => word.startsWith('--seed='))?.slice('--seed='.length) ?? 1);
const names = words.filter((word) => !word.startsWith('--'));
const unknown = names.find((name) => !measures.some((measure) => measure.name === name));

if (unknown !== undefined || !Number.isInteger(seed)) {
  process.stderr.write(`${unknown === undefined ? 'The seed must be a whole number.' : `There is no measure "${unknown}"; there are ${measures.map(({ name }) => name).join(', ')}.`}\n`);
  process.exitCode = 2;
} else {
  await bench();
}

async function bench(): Promise<void> {
  await buildForTests();
  const product = await startProduct({ ownCluster: true });
  const browser = await launchChromium();
  try {
    for (const measure of measures.filter(({ name }) => names.length === 0 || names.includes(name))) {
      const load = os.loadavg()[0] ?? 0;
      const pairs = await measure.run({ product, browser, seed });
      const command = `npm run bench -- ${measure.name} --seed=${seed}`;
      if (!writeResults(measure, pairs, { seed, load, command })) process.exitCode = 1;
    }
  } finally {
    await browser.close();
    await product.stop();
  }
}
