import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { caseCourse } from '@/lib/case/course/case-course';
import { recordSentences, type RecordPart } from '@/lib/text/record-sentences';
import { secondsWords, spanWords } from '@/lib/text/span-words';
import { blindScript } from '@/tests/lib/case/course/record-script';
import { randomCase } from '@/tests/lib/case/course/random-case';
import { everyKindCase } from '@/tests/lib/case/every-kind';
import type { CaseBuilder } from '@/tests/support/case-builder';
import { monitoredUlnar, openedCase } from '@/tests/support/ulnar-case';

const parts = (script: CaseBuilder, timeZone = 'UTC') => recordSentences(caseCourse(script.entries), timeZone);
const plain = (text: string) => text.replaceAll('\u00a0', ' ');
const of = (script: CaseBuilder, id: RecordPart['id'], timeZone?: string) => parts(script, timeZone).find((part) => part.id === id)!.paragraphs.flat().map(plain);

describe('recordSentences', () => {
  it('recordSentences tells what was done, in the time of the hospital', () => {
    expect(of(everyKindCase(), 'done')).toEqual([
      'Ulnar nerve at the elbow, transposition, left side, Theatre 3.',
      'Opened 10:01, time-out with patient and side 10:01.',
      'Monitored 10:30 to 11:10, 40 min.',
      '27 runs at 5 sites, 2 steps logged, 2 of risk.',
      'Closed 11:20.',
    ]);
    expect(of(everyKindCase(), 'done', 'Europe/Berlin')[4]).toBe('Closed 12:20.');
  });

  it('recordSentences tells each alert with its numbers, its times and its end', () => {
    expect(of(everyKindCase(), 'alerts')).toEqual([
      '2 alerts, 1 notice.',
      'Notice, ulnar, first seen 10:36:00: onset late, onset +0.35 ms at 10:36:00, not between the tested sites.',
      'Last good run 10:30:04, no step logged between.',
      'Raised 0 s after first seen.',
      'Settled 10:36:09: the repeat was inside the limits.',
      'Alert, ulnar, first seen 10:41:55: response lost, lowest 0 % of baseline at 10:44:00, between above and below elbow.',
      'Last good run 10:30:02, then nerve lifted 10:41:20.',
      'Raised 17 s after first seen, confirmed by a repeat. From the raise: painted 0 s, told 9 s, read back 13 s, surgeon’s action (Traction released) 17 s, tested again 108 s.',
      'Back inside its limits 10:46:00. Ended 10:46:01: full recovery, cause surgical. Lifted too far.',
      'Alert, ulnar, first seen 10:50:00: amplitude down, raised at 30 % of baseline, 93 % after the correction, place not known.',
      'Last good run 10:30:01, then nerve lifted 10:41:20.',
      'Raised 100 s after first seen, not repeated in time.',
      'Withdrawn 10:51:40: run 78 was corrected.',
    ]);
  });

  it('recordSentences sets the outcome against the opening baseline', () => {
    expect(of(everyKindCase(), 'outcome')[0]).toBe('Ulnar to ADM, last run against opening baseline: axilla 93 %, above elbow 92 %, below elbow 98 %, wrist 99 %.');
  });

  it('recordSentences sums the blind time by cause, the longest first', () => {
    expect(of(blindScript(), 'blind')).toEqual([
      'Some nerve at risk could not be seen for 41 min 34 s of 55 min of monitoring (76 %): not tested in time 35 min 4 s, not tested since a risk step 2 min 4 s, muscle responses could not be judged 1 min 56 s, paused 1 min, back in set-up or baseline phase 1 min, not compared 30 s.',
      'Freshness limit 5 min, custom.',
    ]);
  });

  it('recordSentences names what is missing, and an open case as one', () => {
    expect(of(blindScript(), 'not-done')).toEqual([
      'No examination before the operation is recorded.',
      'No examination after the operation is recorded.',
      'One baseline was accepted provisionally and not accepted by a physician.',
      'Alert ulnar-1: no wall said that it was painted, not told, not read back, no surgeon’s action.',
    ]);
    expect(of(blindScript(), 'done').at(-1)).toBe(`Not closed: this is the record up to entry ${blindScript().seq}.`);
    expect(of(everyKindCase(), 'not-done')).toContain('Not tested after the last risk step: axilla to ADM, above elbow to ADM, below elbow to ADM, wrist to ADM.');
  });

  it('recordSentences says over the limit where a step of handling took longer, and that the limit is custom', () => {
    const script = monitoredUlnar().at('10:41');
    for (let count = 0; count < 2; count += 1) script.wait(1000).run('above-elbow', { adm: { kind: 'measured', onsetMs: 8.31, amplitudeUv: 3000, durationMs: null } });
    script.wait(61_000).give({ name: 'tell-alert', alertId: 'ulnar-1', whom: 'Surgeon', how: 'Aloud', words: 'Changed' });
    script.wait(60_000).give({ name: 'read-back-alert', alertId: 'ulnar-1', words: null });
    expect(of(script, 'alerts')).toContain('Raised 1 s after first seen, confirmed by a repeat. From the raise: told 61 s, over the limit of 60 s, custom, read back 121 s, over the limit of 120 s, custom.');
  });

  it('recordSentences of a case in which nothing happened says so in every part', () => {
    const said = parts(openedCase());
    expect(said.map((part) => part.paragraphs[0]?.[0])).toEqual([
      'Ulnar nerve at the elbow, transposition, left side, Theatre.', 'No baseline was accepted.', 'No notice and no alert.', 'No path was run.', 'Nothing was monitored.', 'No examination before the operation is recorded.',
    ]);
  });

  it('every sentence ends with a full stop, holds no empty value, and advises nothing, in cases of chance', () => {
    fc.assert(
      fc.property(randomCase, (script) => {
        for (const sentence of parts(script).flatMap((part) => part.paragraphs.flat())) {
          expect(sentence).toMatch(/^[A-Z0-9].*\.$/);
          expect(sentence).not.toMatch(/undefined|null|NaN|Infinity|\.\.|\(\)/);
          expect(sentence).not.toMatch(/\b(should|must|recommend|advise|likely|expect(ed)?|prognosis|will)\b/i);
        }
      }),
      { numRuns: 40 },
    );
  });
});

describe('secondsWords and spanWords', () => {
  it.each([[0, '0 s'], [108_999, '108 s'], [599_999, '599 s'], [600_000, '10 min']] as const)('secondsWords of %s ms is %s', (ms, words) => expect(plain(secondsWords(ms))).toBe(words));
  it.each([[59_999, '59 s'], [60_000, '1 min'], [124_000, '2 min 4 s'], [3_599_000, '59 min 59 s'], [4_321_000, '1 h 12 min']] as const)('spanWords of %s ms is %s', (ms, words) => expect(plain(spanWords(ms))).toBe(words));
});
