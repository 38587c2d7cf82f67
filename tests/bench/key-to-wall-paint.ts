import { openMonitoredDesk } from '@/tests/e2e/monitored-desk';
import { ulnarBaseline } from '@/tests/support/ulnar-case';
import { WallScreen } from '@/tests/support/wall-screen';

import { lastEnterMs, openBarePages, paintOf, stampEnter } from './bare-pages';
import type { Measure } from './measure';
import { seededDice } from './seeded-dice';

const runCount = 220;
/** The first ones warm both sides up and are not counted. */
const warmUpCount = 20;

/** From Enter on a typed run at the real desk to its % on the real wall's paint, against a key between two bare pages. */
export const keyToWallPaint: Measure = {
  name: 'desk.key_to_wall_paint_ms',
  shares: { p50: 0.5, p99: 0.99 },
  run: async ({ product, browser, seed }) => {
    const dice = seededDice(seed);
    const { desk, http } = await openMonitoredDesk(browser, product);
    const wall = await WallScreen.open(browser, product.url);
    await http.pair(await wall.code());
    await wall.waitForLead(/^Stable$/);
    await stampEnter(desk.page);
    const bare = await openBarePages(browser);
    const productMs: number[] = [];
    const baselineMs: number[] = [];
    let share = 99;
    for (let run = 0; run < runCount + warmUpCount; run += 1) {
      // Another whole percent than before and than 100, so that only this run can bring it to the wall.
      share = 85 + ((share - 85 + 1 + Math.floor(dice() * 12)) % 14);
      await desk.typeRun('4', [[ulnarBaseline.wrist.onsetMs.toFixed(2), ((ulnarBaseline.wrist.amplitudeUv * share) / 100_000).toFixed(3)]]);
      const painted = paintOf(wall.page, 'main.wall', `${share} %`);
      await painted.isWatching;
      await desk.page.keyboard.press('Enter');
      const spentMs = (await painted.atMs) - (await lastEnterMs(desk.page));
      const bareMs = await bare.pressOnceMs();
      if (run >= warmUpCount) {
        productMs.push(spentMs);
        baselineMs.push(bareMs);
      }
    }
    const errors = [...desk.watched.errors(), ...wall.watched.errors()];
    if (errors.length > 0) throw new Error(`Chromium reported errors: ${errors.join('; ')}`);
    await bare.close();
    await desk.close();
    await wall.close();
    return { productMs, baselineMs };
  },
};
