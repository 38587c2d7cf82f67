import { describe, expect, it } from 'vitest';

import { ulnarAtElbow } from '@/lib/reference/templates/ulnar-at-elbow';
import { CaseBuilder } from '@/tests/support/case-builder';

const physician = { role: 'physician' } as const;

function planned(): CaseBuilder {
  const script = new CaseBuilder(ulnarAtElbow);
  script.give({ name: 'plan-case', plan: ulnarAtElbow, reference: 'K7-0001', identityCommitment: 'c'.repeat(64) });
  return script;
}

describe('decide on messages and advice', () => {
  it('a message waits from its own time until somebody of another role writes', () => {
    const script = planned();
    script.at('10:05').give({ name: 'send-message', text: 'Amplitude is low' });
    const first = script.state.seq;
    script.at('10:06').give({ name: 'send-message', text: 'Still low' });
    expect(script.state.unanswered).toEqual({ neurophysiologist: { seq: first, at: '2027-03-14T10:05:00.000Z' } });
    script.at('10:07').give({ name: 'send-message', text: 'Test the wrist' }, physician);
    expect(Object.keys(script.state.unanswered)).toEqual(['physician']);
  });

  it('advice waits for the desk, is confirmed once, and nothing else can be confirmed', () => {
    const script = planned();
    script.give({ name: 'give-advice', text: 'Test below the elbow' }, physician);
    const adviceSeq = script.state.seq;
    expect(script.state.advice).toMatchObject([{ seq: adviceSeq, text: 'Test below the elbow', byRole: 'physician', confirmedAt: null }]);
    expect(script.refused({ name: 'confirm-advice', adviceSeq: adviceSeq - 1, text: null })).toMatchObject({ code: 'no-advice' });
    script.at('10:09').give({ name: 'confirm-advice', adviceSeq, text: 'Testing now' });
    expect(script.state.advice[0]?.confirmedAt).toBe('2027-03-14T10:09:00.000Z');
    expect(script.refused({ name: 'confirm-advice', adviceSeq, text: null })).toMatchObject({ code: 'no-advice' });
  });

  it('advice that waits is never dropped: the twenty-first is refused', () => {
    const script = planned();
    for (let count = 1; count <= 20; count += 1) script.give({ name: 'give-advice', text: `Advice ${count}` }, physician);
    expect(script.refused({ name: 'give-advice', text: 'One more' }, physician)).toMatchObject({ code: 'advice-waits' });
    for (const { seq } of script.state.advice) script.give({ name: 'confirm-advice', adviceSeq: seq, text: null });
    expect(script.state.advice.map(({ text }) => text)).toEqual(['Advice 16', 'Advice 17', 'Advice 18', 'Advice 19', 'Advice 20']);
  });

  it('the team of the plan stands in the state', () => {
    const script = new CaseBuilder(ulnarAtElbow);
    const team = [{ personId: 'p-9', role: 'surgeon', displayName: 'Surgeon' }] as const;
    script.give({ name: 'plan-case', plan: ulnarAtElbow, reference: 'K7-0001', identityCommitment: 'c'.repeat(64), team });
    expect(script.entries.map(({ kind }) => kind)).toEqual(['case.planned', 'team.assigned']);
    expect(script.state.team).toEqual(team);
  });
});
