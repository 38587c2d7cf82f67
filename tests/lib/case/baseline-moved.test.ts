import { describe, expect, it } from 'vitest';

import { absent, clock, type CaseBuilder } from '@/tests/support/case-builder';
import { adm, monitoredUlnar, testAll } from '@/tests/support/ulnar-case';

/** Three baseline runs above the elbow at a share of the first baseline, one second apart, accepted. */
function rebase(script: CaseBuilder, share: number): void {
  for (let count = 0; count < 3; count += 1) script.wait(1000).run('above-elbow', { adm: adm('above-elbow', share) }, { purpose: 'baseline' });
  script.give({ name: 'accept-baseline', family: 'through-skin', electrodeId: 'surface', reason: null });
}

describe('a baseline moved while an alert is open', () => {
  it('decide calls being like a baseline that was set after the loss no recovery', () => {
    const script = monitoredUlnar().at('10:41');
    for (let count = 0; count < 2; count += 1) script.wait(5000).run('above-elbow', { adm: adm('above-elbow', 0.38) });
    rebase(script, 0.38);
    for (let count = 0; count < 3; count += 1) expect(script.wait(5000).run('above-elbow', { adm: adm('above-elbow', 0.38) })).toEqual([]);
    expect(script.view().lead).toMatchObject({ kind: 'alert', priority: 'high', headline: 'Ulnar was at 38\u00a0% of baseline' });
    expect(script.view().footer).toContain('Baseline set after −62\u00a0%');
  });

  it('decide lets an alert recover against a baseline that was set after an earlier, ended one', () => {
    const script = monitoredUlnar().at('10:41');
    for (let count = 0; count < 2; count += 1) script.wait(5000).run('above-elbow', { adm: adm('above-elbow', 0.38) });
    rebase(script, 0.38);
    script.give({ name: 'end-alert', alertId: 'ulnar-1', outcome: 'none', cause: 'surgical', text: null });
    for (const share of [0.1, 0.1, 0.38, 0.38]) script.wait(5000).run('above-elbow', { adm: adm('above-elbow', share) });
    expect(script.state.incidents['ulnar']).toMatchObject({ alertId: 'ulnar-2', recoveredAt: new Date(script.nowMs).toISOString() });
  });
});

describe('a late run from before the working baseline', () => {
  it('decide holds it against the opening baseline, which it had at its own time', () => {
    const script = monitoredUlnar().at('10:39');
    rebase(script, 0.95);
    testAll(script.at('10:41'), ['adm'], 0.95);
    expect(script.view().lead.isCalm).toBe(true);
    // 38 % of the opening baseline; of the working one it would be 40 %.
    expect(script.run('above-elbow', { adm: adm('above-elbow', 0.38) }, {}, { eventAt: clock('10:32') })).toEqual(['notice.raised']);
    expect(script.entries.at(-1)?.body).toMatchObject({ worstPercentOfBaseline: 38 });
    expect(script.view().lead).toMatchObject({ kind: 'notice', headline: 'Ulnar was at 38\u00a0% of baseline' });
    expect(script.wait(1000).run('above-elbow', { adm: adm('above-elbow', 0.95) })).toEqual(['notice.settled']);
  });

  it('decide counts it for no calm against the working baseline', () => {
    const script = monitoredUlnar().at('10:39');
    testAll(script);
    rebase(script, 1);
    expect(script.view().lead).toMatchObject({ kind: 'not-tested', headline: '3 of 4 sites tested since baseline' });
    script.run('above-elbow', { adm: adm('above-elbow') }, {}, { eventAt: clock('10:39:04.500') });
    expect(script.view().lead.kind).toBe('not-tested');
    expect(script.state.paths['above-elbow/adm']?.compared).toBeNull();
  });

  it('decide does not compare one from before the first baseline', () => {
    const script = monitoredUlnar().at('10:41');
    expect(script.run('above-elbow', { adm: absent(18) }, {}, { eventAt: clock('10:05:04') })).toEqual([]);
    expect(script.entries.at(-1)?.body).toMatchObject({ paths: [{ kind: 'not-compared', reason: 'no-baseline' }] });
  });

  it('decide judges a corrected one as well', () => {
    const script = monitoredUlnar().at('10:32');
    script.run('above-elbow', { adm: adm('above-elbow') });
    const runSeq = script.state.runs.at(-1)!.seq;
    rebase(script.at('10:39'), 1);
    const run = script.runBody('above-elbow', { adm: absent(18) });
    const kinds = script.give({ name: 'correct-run', runSeq, run, reason: 'Typed wrong' }).map((draft) => draft.kind);
    expect(kinds).toEqual(['run.corrected', 'run.judged', 'notice.raised']);
  });
});
