'use client';

import { useMemo, useState, type FormEvent } from 'react';

import { useLogCase } from '@/app/_features/log/log-context';
import { Panel } from '@/app/_features/log/panel';
import { PhysicianConnected } from '@/app/_features/log/physician-connected';
import { Button } from '@/app/_ui/button';
import { Field } from '@/app/_ui/field';
import { upcast } from '@/lib/case/upcast';
import { clockTime } from '@/lib/text/format';
import { talkLines, talkNote } from '@/lib/text/talk-lines';

const shownLines = 4;

/** The last messages and pieces of advice, who is there to read them, and a line to write one. */
export function MessagesPanel() {
  const { state, entries, waitingEntries, timeZone, give } = useLogCase();
  const [text, setText] = useState('');
  const [problem, setProblem] = useState<string | null>(null);
  const lines = useMemo(() => talkLines(entries.map(upcast).filter((entry) => entry !== null), waitingEntries).slice(-shownLines), [entries, waitingEntries]);
  const handleSubmit = async (event: FormEvent) => {
    event.preventDefault();
    if (text.trim() === '') return;
    setText('');
    const outcome = await give({ name: 'send-message', text });
    if (outcome.kind !== 'refused') return setProblem(null);
    setText(text);
    setProblem(outcome.message);
  };
  return (
    <Panel title="Messages" action={<PhysicianConnected />}>
      {lines.length === 0 ? <p className="mb-2 text-second">Messages with the physician stand here</p> : null}
      <ul aria-live="polite" className="mb-2 flex flex-col gap-1">
        {lines.map((line) => (
          <li key={line.key}>
            <span className="font-mono text-sm text-second">{clockTime(line.at, timeZone)}</span> <b>{line.who}</b>
            {line.isAdvice ? <b> Advice:</b> : null} {line.text}
            {talkNote(line, timeZone) === '' ? null : <span className="block text-sm text-second">{talkNote(line, timeZone)}</span>}
          </li>
        ))}
      </ul>
      {state.status === 'open' ? (
        <form method="post" onSubmit={(event) => void handleSubmit(event)} className="flex items-start gap-2">
          <Field label="Message" isLabelHidden hotkey="M" data-message="yes" autoComplete="off" maxLength={500} value={text} onChange={(event) => setText(event.currentTarget.value)} error={problem} className="flex-1" />
          <Button type="submit">Send</Button>
        </form>
      ) : null}
    </Panel>
  );
}
