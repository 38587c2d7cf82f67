import { describe, expect, it } from 'vitest';

import { absent } from '@/tests/support/case-builder';
import { adm, monitoredUlnar } from '@/tests/support/ulnar-case';

const paintedAt = '2027-03-14T10:42:01.250Z';

describe('decide on what a wall has painted', () => {
  it('notes the first wall for the newest words of an alert, and asks again when it gets worse', () => {
    const script = monitoredUlnar();
    script.wait(60_000).run('above-elbow', { adm: adm('above-elbow', 0.42) });
    const raised = script.state.incidents.ulnar!;
    expect(raised.paintedAt).toBeNull();
    const paint = (entrySeq: number) => script.give({ name: 'note-painted', alertId: raised.alertId, entrySeq, screenId: 'screen-1', paintedAt });
    expect(paint(raised.raisedSeq - 1)).toEqual([]);
    expect(paint(raised.raisedSeq)).toMatchObject([{ kind: 'alert.painted', body: { alertId: 'ulnar-1', entrySeq: raised.raisedSeq, paintedAt } }]);
    expect(script.state.incidents.ulnar?.paintedAt).toBe(paintedAt);
    expect(paint(raised.raisedSeq)).toEqual([]);
    script.wait(9_000).run('above-elbow', { adm: absent(20) });
    expect(script.state.incidents.ulnar).toMatchObject({ level: 'alert', paintedAt: null });
    expect(script.state.incidents.ulnar!.raisedSeq).toBeGreaterThan(raised.raisedSeq);
  });
});

describe('decide on the physician’s acceptance of a baseline', () => {
  it('ends what the desk accepted provisionally, once', () => {
    const script = monitoredUlnar();
    const provisional = Object.values(script.state.baselines);
    const baselineSeq = provisional[0]!.seq;
    expect(provisional.every((baseline) => baseline.isProvisional)).toBe(true);
    expect(script.refused({ name: 'confirm-baseline', baselineSeq: baselineSeq + 1, text: null })).toMatchObject({ code: 'no-baseline' });
    script.give({ name: 'confirm-baseline', baselineSeq, text: null }, { role: 'physician' });
    const waiting = Object.values(script.state.baselines).filter((baseline) => baseline.isProvisional);
    expect(waiting.map((baseline) => baseline.seq)).not.toContain(baselineSeq);
    expect(script.refused({ name: 'confirm-baseline', baselineSeq, text: null })).toMatchObject({ code: 'no-baseline' });
  });
});
