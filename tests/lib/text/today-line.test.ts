import { describe, expect, it } from 'vitest';

import { nonBreakingSpace } from '@/lib/text/format';
import { lastTestAt } from '@/lib/text/last-test-at';
import type { TodayContext } from '@/lib/text/today-context';
import { todayLine } from '@/lib/text/today-line';
import { todayNeed } from '@/lib/text/today-need';
import { unseenLine } from '@/lib/text/unseen-line';
import { clock, type CaseBuilder } from '@/tests/support/case-builder';
import { adm, apb, monitoredUlnar, openedCase, testAll } from '@/tests/support/ulnar-case';

const physician = { personId: 'person-physician', role: 'physician' };

function contextAt(script: CaseBuilder, change: Partial<TodayContext> = {}): TodayContext {
  return { nowMs: script.nowMs, timeZone: 'UTC', isLive: true, deskConnected: true, deskSince: clock('09:50'), peopleConnected: [], viewer: physician, ...change };
}
const lineOf = (script: CaseBuilder, change: Partial<TodayContext> = {}) => spaced(todayLine(script.state, contextAt(script, change)));

/** The line with plain spaces, so that a wrong word does not hide behind a space that does not break. */
function spaced<Value>(value: Value): Value {
  return JSON.parse(JSON.stringify(value).replaceAll(nonBreakingSpace, ' ')) as Value;
}

/** Stable at 10:40:04: every site tested after the nerve was lifted. The physician has accepted the baseline. */
function stable(): CaseBuilder {
  const script = monitoredUlnar();
  const baselineSeq = Object.values(script.state.baselines)[0]!.seq;
  script.at('10:31').give({ name: 'confirm-baseline', baselineSeq, text: null }, { role: 'physician' });
  script.at('10:38').step('nerve-lifted');
  script.at('10:40');
  testAll(script);
  script.run('median-wrist', { apb: apb() });
  return script;
}

/** The same, the nerve lifted once more, with a fall above the elbow seen at 10:41:00 and confirmed at 10:41:20. */
function alerted(): CaseBuilder {
  const script = stable().at('10:40:30');
  script.step('nerve-lifted');
  script.at('10:41');
  script.run('above-elbow', { adm: adm('above-elbow', 0.4, 1.33) });
  script.at('10:41:20').run('above-elbow', { adm: adm('above-elbow', 0.38, 1.38) });
  return script;
}

describe('todayLine', () => {
  it('says a stable case as the wall says it, with the age of its last test and who is there', () => {
    const script = stable().at('10:40:24');
    expect(lineOf(script)).toMatchObject({
      need: 'calm', isCalm: true, mark: 'calm', priority: null, headline: 'Stable', handling: null, others: [], tasks: [],
      place: 'Theatre', phase: 'Monitoring since 10:10', tested: 'Last test 20 s ago', desk: 'Desk connected since 09:50', people: 'Nobody else connected',
    });
  });

  it('says an alert with its place, since when, and that nobody was told', () => {
    const line = lineOf(alerted().at('10:42'));
    expect(line).toMatchObject({ need: 'alert-not-told', since: clock('10:41:20'), mark: 'high', priority: 'high', isCalm: false, headline: 'Ulnar at 38 % of baseline', handling: 'Not told yet' });
    expect(line.why).toContain('first seen 10:41, after nerve lifted');
  });

  it('says told and read back with their times, and ranks the alert below one not told', () => {
    const script = alerted().at('10:42');
    script.give({ name: 'tell-alert', alertId: 'ulnar-1', whom: 'surgeon', how: 'aloud', words: 'Ulnar at 38 per cent' });
    script.at('10:43').give({ name: 'read-back-alert', alertId: 'ulnar-1', words: null });
    expect(lineOf(script)).toMatchObject({ need: 'alert-told', handling: 'Told 10:42, read back 10:43' });
  });

  it('never looks calm while it is not live, and speaks in the past tense with the time of its last check', () => {
    const line = lineOf(stable().at('10:40:24'), { isLive: false });
    expect(line).toMatchObject({
      need: 'not-live', since: clock('10:40:24'), isCalm: false, mark: 'outline', headline: 'Shown then: stable', why: 'Not live. State at 10:40:24. It may have changed.',
      tested: 'Last test known 10:40:04', desk: 'Desk not known', people: 'Who is connected not known',
    });
  });

  it('keeps the mark of an alert that was open when the link went', () => {
    expect(lineOf(alerted(), { isLive: false })).toMatchObject({ need: 'alert-not-told', mark: 'high', priority: 'high', headline: 'Alert was open: ulnar at 38 % of baseline' });
  });

  it('names what waits: message, advice, baseline', () => {
    const script = monitoredUlnar().at('10:32');
    script.give({ name: 'send-message', text: 'Please look at the baseline' });
    script.at('10:32:30').give({ name: 'give-advice', text: 'Repeat from the axilla' }, { role: 'physician' });
    script.at('10:33').give({ name: 'send-message', text: 'Which current' });
    script.at('10:33:10');
    expect(lineOf(script).tasks).toEqual([
      'Message of the neurophysiologist not answered for 10 s',
      'Advice not confirmed by the desk for 40 s',
      'Baseline of 10:05 provisional, waits for you',
    ]);
    expect(lineOf(script, { viewer: { personId: 'person-1', role: 'neurophysiologist' } }).tasks).toContain('Your message not answered for 10 s');
    expect(lineOf(script, { isLive: false }).tasks[0]).toBe('Message of the neurophysiologist not answered then, since 10:33');
  });

  it('lets a message count as need only for whom it waits', () => {
    const script = stable().at('10:40:10');
    script.give({ name: 'send-message', text: 'Stable so far' });
    expect(lineOf(script).need).toBe('message-waits');
    expect(lineOf(script, { viewer: { personId: 'person-1', role: 'neurophysiologist' } }).need).toBe('calm');
  });

  it('does not rest while nobody sits at the desk', () => {
    const line = lineOf(stable(), { deskConnected: false, deskSince: clock('10:39') });
    expect(line).toMatchObject({ need: 'desk-away', since: clock('10:39'), desk: 'Desk not connected since 10:39' });
  });

  it('names others once each, and not the one who looks', () => {
    const since = clock('10:00');
    const surgeon = { personId: 'person-surgeon', role: 'surgeon', displayName: 'Surgeon', since };
    const line = lineOf(stable(), { peopleConnected: [surgeon, { ...physician, displayName: 'Supervising physician', since }, surgeon] });
    expect(line.people).toBe('Surgeon connected');
  });

  it('speaks of the one at the desk once, and of a relief beside them', () => {
    const since = clock('10:00');
    const desk = { personId: 'person-1', role: 'neurophysiologist', displayName: 'Neurophysiologist', since };
    const relief = { ...desk, personId: 'person-2', displayName: 'Relief' };
    expect(lineOf(stable(), { peopleConnected: [desk] }).people).toBe('Nobody else connected');
    expect(lineOf(stable(), { peopleConnected: [desk, relief] }).people).toBe('Relief connected');
    expect(lineOf(stable(), { peopleConnected: [desk], deskConnected: false }).people).toBe('Neurophysiologist connected');
  });

  it('says that nothing is monitored before the baseline, with no test yet', () => {
    expect(lineOf(openedCase())).toMatchObject({ need: 'not-monitored', isCalm: false, headline: 'Set-up', tested: 'Not tested yet' });
  });

  it('says "not tested" of a case whose tests are older than its last risk step', () => {
    const script = stable().at('10:42');
    script.step('nerve-lifted');
    expect(lineOf(script)).toMatchObject({ need: 'not-stable', mark: 'outline', headline: 'Not tested since nerve lifted' });
  });
});

describe('lastTestAt', () => {
  it('counts a test without a response and not a run that nobody read', () => {
    const script = stable().at('10:45');
    script.run('wrist', { adm: { kind: 'not-read' } });
    expect(lastTestAt(script.state)).toBe(clock('10:40:04'));
    script.at('10:46').run('wrist', { adm: { kind: 'absent', highestIntensityMa: 30 } });
    expect(lastTestAt(script.state)).toBe(clock('10:46'));
  });
});

describe('todayNeed', () => {
  const quiet = { kinds: ['stable'], hasUntoldAlert: false, isLive: true, hasMessageForViewer: false, isDeskConnected: true, hasOpenTask: false } as const;
  it.each([
    [{}, 'calm'],
    [{ kinds: ['improved'] }, 'calm'],
    [{ kinds: ['paused'] }, 'not-monitored'],
    [{ hasOpenTask: true }, 'advice-or-baseline-waits'],
    [{ hasOpenTask: true, isDeskConnected: false }, 'desk-away'],
    [{ kinds: ['not-tested'], isDeskConnected: false }, 'not-stable'],
    [{ kinds: ['not-tested'], hasMessageForViewer: true }, 'message-waits'],
    [{ kinds: ['notice'], hasMessageForViewer: true }, 'notice'],
    [{ kinds: ['notice'], isLive: false }, 'not-live'],
    [{ kinds: ['alert'], isLive: false }, 'alert-told'],
    [{ kinds: ['cannot-be-judged'] }, 'cannot-be-judged'],
    [{ kinds: ['alert'], hasUntoldAlert: true, isLive: false }, 'alert-not-told'],
    [{ kinds: [] }, 'not-live'],
  ] as const)('%j: %s', (change, need) => {
    expect(todayNeed({ ...quiet, ...change })).toBe(need);
  });
});

describe('unseenLine', () => {
  it('is not live and not calm', () => {
    expect(unseenLine('case-1', 'Theatre 3')).toMatchObject({ need: 'not-live', isLive: false, isCalm: false, headline: 'Not live yet', tested: 'Last test not known' });
  });
});
