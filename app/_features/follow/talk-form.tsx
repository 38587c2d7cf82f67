'use client';

import { useState, type FormEvent } from 'react';

import { useFollowCase } from '@/app/_features/follow/follow-context';
import { Button } from '@/app/_ui/button';
import { TextArea } from '@/app/_ui/text-area';

/** One box for both: Enter sends a message; advice is given by its own button, because the desk has to confirm it. */
export function TalkForm() {
  const { head, give } = useFollowCase();
  const [text, setText] = useState('');
  const [problem, setProblem] = useState<string | null>(null);
  const send = async (name: 'send-message' | 'give-advice') => {
    if (text.trim() === '') return setProblem('Empty: write what the desk should read');
    const sent = text;
    setText('');
    setProblem(null);
    const outcome = await give({ name, text: sent });
    if (outcome.kind !== 'refused') return;
    setText((now) => (now === '' ? sent : now));
    setProblem(outcome.message);
  };
  const handleSubmit = (event: FormEvent) => {
    event.preventDefault();
    void send('send-message');
  };
  return (
    <form method="post" onSubmit={handleSubmit} className="flex flex-col gap-2">
      <TextArea label="To the desk" value={text} maxLength={500} error={problem} onChange={(event) => setText(event.currentTarget.value)} />
      <div className="flex flex-wrap gap-2">
        <Button type="submit" hotkey="Enter">Send message</Button>
        {head.role === 'physician' ? <Button variant="primary" onClick={() => void send('give-advice')}>Give advice</Button> : null}
      </div>
      {head.role === 'physician' ? <p className="text-[0.9em] text-second">Advice stands at the desk until the neurophysiologist confirms it</p> : null}
    </form>
  );
}
