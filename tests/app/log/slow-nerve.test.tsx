import { cleanup, render } from '@testing-library/react';
import { afterEach, describe, expect, it } from 'vitest';

import { AgainstBaseline } from '@/app/_features/log/against-baseline';
import { askBack } from '@/app/_features/log/ask-back';
import { runRows } from '@/app/_features/log/run-rows';
import { velocityWithError } from '@/app/_features/log/velocity-with-error';
import { judgeInCase } from '@/lib/case/judge-in-case';
import { nerveLineView } from '@/lib/chart/nerve-line-view';
import { measured } from '@/tests/support/case-builder';
import { monitoredUlnar } from '@/tests/support/ulnar-case';

afterEach(cleanup);

/*
 * A regenerating stretch across the elbow: below the elbow answers at 6.46 ms, above it 28.57 ms later, at 35.03 ms.
 * 100 mm / 28.57 ms = 3.50 m/s. Error: 2 mm of 100 mm and twice 0.05 ms of 28.57 ms, together 2.0 %: 0.07 m/s.
 * Against the baseline's 8.31 ms: +26.72 ms. The axilla answers 2.46 ms later still, as fast as at baseline.
 */
function slowElbow() {
  const script = monitoredUlnar().wait(1000);
  script.run('below-elbow', { adm: measured(6.46, 9200) });
  script.run('axilla', { adm: measured(37.49, 8600) });
  script.wait(1000);
  const run = script.runBody('above-elbow', { adm: measured(35.03, 8900) });
  const judged = judgeInCase(script.state, { at: new Date(script.nowMs).toISOString(), run });
  return { script, run, judged };
}

describe('a nerve at 3.5 m/s', () => {
  it('is asked back with the value, never refused', () => {
    const { script, judged } = slowElbow();
    expect(askBack(judged.segments, script.plan)).toBe('3.5 m/s between above and below elbow over 100 mm. Under 10 m/s: is a distance in centimetres typed as millimetres?');
  });

  it('stands in the form and in the log with one digit and its error', () => {
    const { script, run, judged } = slowElbow();
    const path = judged.paths.find((one) => one.pathId === 'above-elbow/adm')!;
    const segment = judged.segments.find((one) => one.proximalSiteId === 'above-elbow')!;
    const { container } = render(<AgainstBaseline preview={{ path, segment }} />);
    expect(container.textContent).toContain('3.5\u00a0±0.1\u00a0m/s');
    script.run('above-elbow', { adm: measured(35.03, 8900) });
    const body = script.entries.findLast((entry) => entry.kind === 'run.judged')!.body as never;
    const [row] = runRows({ seq: 1, at: '', run, judged: body, notes: [], isAlert: false, isCorrected: false, isWaiting: false }, script.plan);
    expect(row).toMatchObject({ onset: '35.03', change: '+26.72', velocity: '3.5 ±0.1' });
  });

  it('is drawn on the nerve with the same number', () => {
    const { script } = slowElbow();
    script.run('above-elbow', { adm: measured(35.03, 8900) });
    const texts = nerveLineView(script.state, 'ulnar', script.nowMs).segments.map((segment) => segment.text);
    expect(texts).toContainEqual(expect.stringMatching(/^3\.5\u00a0m\/s/));
  });
});

describe('velocityWithError', () => {
  it.each([
    [58.99, 1.2, '59 ±1'],
    [58.99, 0.2, '59 ±1'],
    [31.06, 1.6, '31 ±2'],
    [3.5, 0.071, '3.5 ±0.1'],
    [3.5, 0.26, '3.5 ±0.3'],
  ])('%s with an error of %s is %s', (velocityMps, errorMps, words) => expect(velocityWithError(velocityMps, errorMps)).toBe(words));
});
