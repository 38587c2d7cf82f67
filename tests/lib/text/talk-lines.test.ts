import { expect, it } from 'vitest';

import { upcast } from '@/lib/case/upcast';
import type { CaseEntry } from '@/lib/case/entry-bodies';
import { talkLines, talkNote } from '@/lib/text/talk-lines';
import { openedCase } from '@/tests/support/ulnar-case';

const entriesOf = (script: ReturnType<typeof openedCase>) => script.entries.map(upcast).filter((entry): entry is CaseEntry => entry !== null);

it('talkLines is one thread of messages and advice, and says how the desk took the advice', () => {
  const script = openedCase().at('10:10');
  script.give({ name: 'send-message', text: 'Baseline ready' });
  script.at('10:11').give({ name: 'give-advice', text: 'Repeat from the axilla' }, { role: 'physician' });
  const adviceSeq = script.seq;
  const [message, advice] = talkLines(entriesOf(script), []);
  expect(message).toMatchObject({ who: 'Neurophysiologist', text: 'Baseline ready', isAdvice: false, isWaiting: false });
  expect(talkNote(message!, 'UTC')).toBe('');
  expect(advice).toMatchObject({ who: 'physician', isAdvice: true, confirmedAt: null });
  expect(talkNote(advice!, 'UTC')).toBe('Not confirmed by the desk yet');
  script.at('10:12').give({ name: 'confirm-advice', adviceSeq, text: 'Next run' });
  const lines = talkLines(entriesOf(script), []);
  expect(lines).toHaveLength(2);
  expect(talkNote(lines[1]!, 'UTC')).toBe('Confirmed by the desk 10:12: Next run');
});

it('talkLines puts what waits last and says so, also of advice', () => {
  const script = openedCase();
  script.give({ name: 'give-advice', text: 'Warm the limb' }, { role: 'physician' });
  const [given] = entriesOf(script).slice(-1);
  const lines = talkLines([], [given!]);
  expect(lines).toMatchObject([{ isWaiting: true, isAdvice: true }]);
  expect(talkNote(lines[0]!, 'UTC')).toBe('Waits in this browser, not sent yet');
});
