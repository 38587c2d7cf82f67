import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import type { CaseCommand } from '@/lib/case/commands';
import { commandRequestSchema, personCommandSchema } from '@/lib/contracts/http/commands';
import { canonicalBytes } from '@/lib/record/canonical-bytes';
import { ulnarAtElbow } from '@/lib/reference/templates/ulnar-at-elbow';
import { bounds } from '@/lib/units/bounds';
import { commandArbitrary } from '@/tests/lib/contracts/command-arbitrary';
import { adm, monitoredUlnar, openedCase } from '@/tests/support/ulnar-case';

const effort = process.env['FASCICLE_TEST_FULL'] === '1' ? 10 : 1;
const run = openedCase().runBody('wrist', { adm: adm('wrist') });
const logRun = (change: object, reading: object = {}) => ({
  name: 'log-run', run: { ...run, readings: [{ channelId: 'adm', reading: { ...run.readings[0]!.reading, ...reading } }], ...change },
});
const condition = (fields: object) => ({ name: 'log-condition', condition: fields, reportedBy: null });
const rules = (change: object) => ({ name: 'revise-plan', plan: { ...ulnarAtElbow, rules: { ...ulnarAtElbow.rules, ...change } } });
const problems = (command: unknown) => (personCommandSchema.safeParse(command).error?.issues ?? []).map((issue) => issue.message);

describe('personCommandSchema and decide', () => {
  it('decide handles every command that the contract lets in, without a throw and without a number that is none', () => {
    const [opened, monitored, alerted] = [openedCase(), monitoredUlnar(['adm', 'fdi']), monitoredUlnar()];
    for (let count = 0; count < 2; count += 1) alerted.wait(1000).run('above-elbow', { adm: adm('above-elbow', 0.38) });
    let accepted = 0;
    fc.assert(
      fc.property(fc.constantFrom(opened, monitored, alerted), fc.array(commandArbitrary, { minLength: 6, maxLength: 12 }), (start, commands) => {
        const script = start.fork();
        for (const command of commands) {
          const parsed = personCommandSchema.safeParse(JSON.parse(JSON.stringify(command)));
          expect(parsed.error?.issues ?? []).toEqual([]);
          if (!parsed.success) return;
          script.wait(1000);
          try {
            const drafts = script.give(parsed.data as CaseCommand);
            accepted += 1;
            // RFC 8785 has no form for NaN or Infinity: writing the bytes proves that there is none.
            for (const draft of drafts) expect(JSON.parse(new TextDecoder().decode(canonicalBytes(draft)))).toEqual(JSON.parse(JSON.stringify(draft)));
          } catch (error) {
            expect(String(error)).toMatch(/^Error: Refused: [A-Z][^\n]{8,}/);
          }
          script.timers();
          expect(script.view().lead.headline.length).toBeGreaterThan(0);
        }
      }),
      { numRuns: 300 * effort },
    );
    expect(accepted).toBeGreaterThan(300);
  });
});

describe('personCommandSchema, bounds', () => {
  it.each([
    ['onset', (onsetMs: number) => logRun({}, { onsetMs }), bounds.onsetMs],
    ['amplitude', (amplitudeUv: number) => logRun({}, { amplitudeUv }), bounds.amplitudeUv],
    ['duration', (durationMs: number) => logRun({}, { durationMs }), bounds.durationMs],
    ['current', (intensityMa: number) => logRun({ intensityMa }), bounds.intensityMa],
    ['current of the largest response', (maximalResponseMa: number) => logRun({ maximalResponseMa }), bounds.intensityMa],
    ['highest current tried', (highestIntensityMa: number) => logRun({ readings: [{ channelId: 'adm', reading: { kind: 'absent', highestIntensityMa } }] }), bounds.intensityMa],
    ['pulse width', (pulseWidthUs: number) => logRun({ pulseWidthUs }), bounds.pulseWidthUs],
    ['position', (positionMm: number) => ({ name: 'measure-distances', nerveId: 'ulnar', positions: [{ siteId: 'wrist', positionMm }], reason: null }), bounds.positionMm],
    ['limb temperature', (temperatureC: number) => condition({ kind: 'limb-temperature', temperatureC }), bounds.temperatureC],
    ['mean pressure', (pressureMmHg: number) => condition({ kind: 'mean-pressure', pressureMmHg }), bounds.meanPressureMmHg],
    ['cuff pressure', (pressureMmHg: number) => condition({ kind: 'tourniquet', isUp: true, pressureMmHg }), bounds.cuffPressureMmHg],
    ['train-of-four count', (count: number) => condition({ kind: 'train-of-four', count, ratio: null }), bounds.trainOfFourCount],
    ['train-of-four ratio', (ratio: number) => condition({ kind: 'train-of-four', count: 4, ratio }), bounds.trainOfFourRatio],
  ] as const)('personCommandSchema bounds the %s on both sides and says why', (_field, command, { min, max, reason }) => {
    expect(problems(command(min))).toEqual([]);
    expect(problems(command(max))).toEqual([]);
    for (const value of [min - 1, max + 1]) {
      const [message] = problems(command(value));
      expect(message).toMatch(/^Out of range: /);
      expect(message).toContain(reason);
    }
    for (const value of [Number.NaN, Number.POSITIVE_INFINITY, '8' as unknown as number, null as unknown as number, [8] as unknown as number].filter((one) => one !== null || !/largest|ratio|cuff|onset|amplitude|duration/.test(_field))) {
      expect(problems(command(value)).length).toBeGreaterThan(0);
    }
  });

  it.each([
    ['a count that is not whole', condition({ kind: 'train-of-four', count: 2.5, ratio: null })],
    ['a limit of 0 %', rules({ amplitudeNoticeFallPercent: 0 })],
    ['a limit of 100 %', rules({ amplitudeNoticeFallPercent: 100 })],
    ['a freshness limit of 31 min', rules({ freshnessMinutes: 31 })],
    ['a repeat within 9 s', rules({ repeatLostWithinSeconds: 9 })],
    ['another version of the rules', rules({ version: 2 })],
    ['a measured response without a measure', logRun({}, { onsetMs: null, amplitudeUv: null, durationMs: 5 })],
    ['a channel twice', logRun({ readings: [run.readings[0], run.readings[0]] })],
    ['no channel', logRun({ readings: [] })],
    ['a site that is no slug', logRun({ siteId: 'Above elbow' })],
    ['a run number of 0', { name: 'correct-run', runSeq: 0, run: null, reason: 'Typed wrong' }],
    ['an empty reason', { name: 'correct-run', runSeq: 5, run: null, reason: '   ' }],
    ['an alert id without a number', { name: 'act-on-alert', alertId: 'ulnar', action: 'Released' }],
    ['a command nobody may give', { name: 'miss-repeat', alertId: 'ulnar-1' }],
    ['a plan in the middle', { name: 'plan-case', plan: ulnarAtElbow, reference: 'K7', identityCommitment: 'c' }],
    ['no command', null],
    ['a list', []],
  ])('personCommandSchema refuses %s with a sentence', (_case, command) => {
    expect(problems(command)[0]).toMatch(/^[A-Z].{5,}/);
  });
});

describe('personCommandSchema, keys and text', () => {
  const commands = [logRun({}), condition({ kind: 'other', text: 'Arm moved' }), { name: 'send-message', text: 'Agree' }, rules({})];

  /** Every object within a value, with a way to copy the value where that object has one more key. */
  function withStranger(value: unknown): unknown[] {
    if (Array.isArray(value)) return value.flatMap((one, index) => withStranger(one).map((changed) => value.map((other: unknown, at) => (at === index ? changed : other))));
    if (typeof value !== 'object' || value === null) return [];
    const inside = Object.entries(value).flatMap(([key, one]) => withStranger(one).map((changed) => ({ ...value, [key]: changed })));
    return [{ ...value, stranger: 1 }, ...inside];
  }

  it('personCommandSchema refuses an unknown key in every object of a command', () => {
    for (const command of commands) {
      expect(problems(command)).toEqual([]);
      const strangers = withStranger(command);
      expect(strangers.length).toBeGreaterThan(0);
      expect(strangers.filter((one) => problems(one).length === 0)).toEqual([]);
    }
  });

  /** Every free text of a command replaced. */
  const texts = (text: string) => [
    { name: 'send-message', text },
    logRun({ note: text }),
    condition({ kind: 'relaxant', text }),
    { name: 'log-step', stepId: 'other', label: text },
    { name: 'tell-alert', alertId: 'ulnar-1', whom: text, how: 'Aloud', words: 'Lost' },
    { name: 'change-phase', phase: 'paused', reason: text },
    { name: 'revise-plan', plan: { ...ulnarAtElbow, theatre: text } },
  ];

  it.each([
    ['NUL', 'a\u0000b'],
    ['a control character', 'a\u0007b'],
    ['a lone high surrogate', 'a\ud83d'],
    ['a lone low surrogate', '\udc4da'],
    ['nothing', ''],
    ['spaces only', ' \n '],
    ['a thousand characters', 'a'.repeat(1000)],
  ])('personCommandSchema refuses a text with %s everywhere', (_case, text) => {
    expect(texts(text).filter((command) => problems(command).length === 0)).toEqual([]);
  });

  it('personCommandSchema lets every script of the world pass', () => {
    expect(texts('Größe µ 😀 腕').flatMap(problems)).toEqual([]);
  });
});

describe('commandRequestSchema', () => {
  const request = { commandId: '018f0000-0000-7000-8000-000000000001', eventAt: '2027-03-14T10:41:20.000Z', command: { name: 'send-message', text: 'Agree' } };
  const ok = (change: object) => commandRequestSchema.safeParse({ ...request, ...change }).success;

  it.each([
    ['a day that is not', { eventAt: '2027-02-30T10:00:00.000Z' }],
    ['an hour that is not', { eventAt: '2027-03-14T24:00:00.000Z' }],
    ['no milliseconds', { eventAt: '2027-03-14T10:41:20Z' }],
    ['another zone', { eventAt: '2027-03-14T10:41:20.000+01:00' }],
    ['a command id that is no UUID', { commandId: 'repeat/ulnar-1/31' }],
    ['an upper-case UUID', { commandId: request.commandId.toUpperCase().replace('8000', 'ABCD') }],
    ['a stranger', { caseId: request.commandId }],
  ])('commandRequestSchema refuses %s', (_case, change) => expect(ok(change)).toBe(false));

  it('commandRequestSchema lets a good one pass', () => expect(ok({})).toBe(true));
});
