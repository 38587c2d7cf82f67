import { describe, expect, it } from 'vitest';

import { courseEntries } from '@/lib/case/course/course-entries';
import { countedVersion, courseRuns } from '@/lib/case/course/course-runs';
import { everyKindCase } from '@/tests/lib/case/every-kind';
import { clock } from '@/tests/support/case-builder';
import { adm, monitoredUlnar } from '@/tests/support/ulnar-case';

const percentOf = (paths: readonly { kind: string }[]) => paths.map((path) => ('change' in path ? (path.change as { percentOfBaseline: number }).percentOfBaseline : null));

describe('courseRuns', () => {
  it('courseRuns keeps the original with its own judgement and the correction beside it', () => {
    const run = courseRuns(courseEntries(everyKindCase().entries)).find((one) => one.corrections.length > 0)!;
    expect(run.at).toBe(clock('10:50'));
    expect([percentOf(run.original.paths), percentOf(run.corrections[0]!.paths)]).toEqual([[30], [93]]);
    expect(run.corrections[0]).toMatchObject({ at: clock('10:51:40'), reason: 'Typed 2.6 for 8.0' });
    expect(countedVersion(run)).toBe(run.corrections[0]);
  });

  it('courseRuns keeps a withdrawn run and says that nothing counts of it', () => {
    const script = monitoredUlnar().at('10:41');
    script.run('wrist', { adm: adm('wrist', 0.9) });
    const runSeq = script.state.runs.at(-1)!.seq;
    script.give({ name: 'correct-run', runSeq, run: null, reason: 'Wrong site' });
    const run = courseRuns(courseEntries(script.entries)).at(-1)!;
    expect(percentOf(run.original.paths)).toEqual([90]);
    expect(countedVersion(run)).toMatchObject({ run: null, reason: 'Wrong site', paths: [] });
  });

  it('courseRuns marks a late entry from one minute on', () => {
    const script = monitoredUlnar().at('10:41');
    script.run('wrist', { adm: adm('wrist') }, {}, { eventAt: clock('10:40:00.001') });
    script.run('wrist', { adm: adm('wrist') }, {}, { eventAt: clock('10:40') });
    expect(courseRuns(courseEntries(script.entries)).slice(-2).map((run) => run.lateMs)).toEqual([null, 60_000]);
  });
});
