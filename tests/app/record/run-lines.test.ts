import { describe, expect, it } from 'vitest';

import { runLines } from '@/app/_features/record/run-lines';
import { caseCourse } from '@/lib/case/course/case-course';
import { recordCase } from '@/tests/support/record-case';

const course = caseCourse(recordCase().entries);
const lines = runLines(course.runs, course.final.plan);
const plain = (text: string) => text.replaceAll('\u00a0', ' ');

describe('runLines', () => {
  it('runLines has one line for each channel of each version of a run', () => {
    const count = course.runs.reduce((sum, run) => sum + [run.original, ...run.corrections].reduce((inner, version) => inner + (version.run?.readings.length ?? 1), 0), 0);
    expect(lines).toHaveLength(count);
    expect(new Set(lines.map((line) => line.key)).size).toBe(count);
  });

  it('runLines shows the original reading of a corrected run above its correction, each with its own % of baseline', () => {
    const corrected = lines.filter((line) => line.run.corrections.length > 0 && line.channel === 'ADM');
    expect(corrected.map(({ versionName, reading, percent, remark }) => [versionName, plain(reading), plain(percent), remark])).toEqual([
      ['original', 'onset 6.46 ms, 0.8 mV', '9 %', 'amplitude down'],
      ['correction', 'onset 6.46 ms, 8.8 mV', '96 %', 'reason: Typed 0.83 for 8.83'],
    ]);
  });

  it('runLines says why a run was not compared, and nothing of it where a baseline is made', () => {
    const weak = lines.find((line) => line.isNotCompared);
    expect(weak).toMatchObject({ isNotCompared: true, percent: '', site: 'Wrist', remark: 'not compared, current not supramaximal' });
    expect(lines[0]).toMatchObject({ isNotCompared: false, remark: 'baseline run' });
  });
});
