import { describe, expect, test } from 'vitest';

import type { Scenario } from '@/server/demo/scenario';
import { neuroma } from '@/server/demo/scenarios/neuroma';
import { relaxant } from '@/server/demo/scenarios/relaxant';
import { tourniquet } from '@/server/demo/scenarios/tourniquet';
import { tumour } from '@/server/demo/scenarios/tumour';
import { ulnar } from '@/server/demo/scenarios/ulnar';
import { percentOf, toldEntries, toldResponses } from '@/tests/server/demo/read-case';

/**
 * Of which response each percentage in a text is said, in the order of the texts; by hand, from reading them. "opening"
 * means the first baseline of the path.
 */
const spoken: readonly (readonly [Scenario, readonly string[]])[] = [
  [ulnar, ['axilla/adm', 'told above-elbow', 'above-elbow/adm', 'below-elbow/adm', 'axilla/adm', 'axilla/adm', 'median-wrist/apb']],
  [tumour, ['told fibular-above', 'fibular-above/ta', 'fibular-below/ta', 'tibial-above/gm', 'fibular-above/ta', 'fibular-above/ta', 'tibial-above/gm', 'opening fibular-above/ta', 'tibial-above/gm']],
  [neuroma, ['above-neuroma/hook-above', 'above-neuroma/hook-above']],
  [relaxant, ['told above-elbow', 'median-wrist/apb', 'axilla/adm', 'median-wrist/apb', 'axilla/adm', 'median-wrist/apb']],
  [tourniquet, ['popliteal-fossa/ta', 'told above-neck', 'above-neck/ta', 'below-neck/ta', 'opposite-fibular-head/ta-opposite', 'popliteal-fossa/ta', 'popliteal-fossa/ta', 'opposite-fibular-head/ta-opposite']],
];

describe.each(spoken)('percentages in words', (scenario, meant) => {
  test(`of the ${scenario.name} case are those of the runs`, () => {
    const entries = toldEntries(scenario);
    const responses = toldResponses(scenario.plan, entries);
    const said = entries.flatMap((entry) => {
      const text = 'text' in entry.body ? entry.body.text : entry.kind === 'alert.told' ? entry.body.words : null;
      return [...(text ?? '').matchAll(/(\d+) (?:%|per cent)/g)].map((found) => ({ seq: entry.seq, percent: Number(found[1]), text }));
    });
    expect(said.map(({ text }) => text)).toHaveLength(meant.length);
    for (const [index, { seq, percent, text }] of said.entries()) {
      const [kind = '', path = kind] = (meant[index] ?? '').split(' ');
      const before = responses.filter((response) => response.seq < seq && `${response.siteId}/${response.channelId}`.startsWith(path));
      const newestSeq = before.at(-1)!.seq;
      // What is told is the lowest of the muscles.
      const exact = kind === 'opening' ? ofOpening(before) : Math.min(...before.filter((response) => response.seq === newestSeq).map(percentOf));
      expect(Math.abs(percent - exact), `"${text}" says ${percent}, the run shows ${exact.toFixed(2)}`).toBeLessThanOrEqual(0.56);
    }
  });
});

function ofOpening(before: readonly { readonly amplitudeUv: number; readonly baseline: { readonly amplitudeUv: number } | null }[]): number {
  const opening = before.find((response) => response.baseline !== null)!.baseline!;
  return (100 * before.at(-1)!.amplitudeUv) / opening.amplitudeUv;
}
