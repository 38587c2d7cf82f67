'use client';

import { useQuery } from '@tanstack/react-query';
import { useState, type FormEvent } from 'react';

import { ConsoleDialog } from '@/app/_features/log/console-dialog';
import { useLogCase } from '@/app/_features/log/log-context';
import { readScreens, revokeScreen } from '@/app/_features/log/read-screens';
import { WallList } from '@/app/_features/log/wall-list';
import { pairScreen } from '@/app/_live/api';
import { Button } from '@/app/_ui/button';
import { Field } from '@/app/_ui/field';

/** Binds a wall to this case: its code, then the two words read aloud on both sides. */
export function PairDialog({ onClose }: { readonly onClose: () => void }) {
  const { caseId } = useLogCase();
  const [code, setCode] = useState('');
  const [words, setWords] = useState<string | null>(null);
  const [problem, setProblem] = useState<string | null>(null);
  const [isSending, setIsSending] = useState(false);
  const screens = useQuery({ queryKey: ['screens', caseId], queryFn: () => readScreens(caseId), refetchInterval: 3000 });

  const ask = async (isConfirmed: boolean) => {
    setIsSending(true);
    setProblem(null);
    try {
      const reply = await pairScreen(caseId, { code: code.trim().toUpperCase(), isConfirmed });
      setWords(reply.isPaired ? null : reply.words);
      if (reply.isPaired) {
        setCode('');
        await screens.refetch();
      }
    } catch (cause) {
      setProblem(cause instanceof Error ? cause.message : 'Not paired: no answer that this page can read');
    }
    setIsSending(false);
  };
  const handleSubmit = (event: FormEvent) => {
    event.preventDefault();
    if (!isSending) void ask(words !== null);
  };
  const revoke = async (screenId: string) => {
    try {
      await revokeScreen(caseId, screenId);
    } catch (cause) {
      setProblem(cause instanceof Error ? cause.message : 'Not ended: no answer that this page can read');
    }
    await screens.refetch();
  };
  return (
    <ConsoleDialog isOpen onOpenChange={(isOpen) => (isOpen ? undefined : onClose())} title="Pair a wall" description="Open /screen on the wall’s display. It shows a code and two words.">
      <form method="post" noValidate onSubmit={handleSubmit} className="flex flex-col gap-4">
        {words === null ? (
          <Field label="Code on the wall" hint="Six letters or digits" value={code} maxLength={6} autoComplete="off" autoFocus className="w-56 [&_input]:font-mono [&_input]:uppercase" onChange={(event) => setCode(event.currentTarget.value)} />
        ) : (
          <div>
            <p className="text-second">Read aloud and compare with the wall</p>
            <p className="py-1 text-2xl font-bold">{words}</p>
          </div>
        )}
        {problem === null ? null : <p role="alert" className="border-l-4 border-ink pl-3 font-semibold">{problem}</p>}
        <div className="flex flex-wrap gap-3">
          <Button type="submit" variant="primary" disabled={isSending || code.trim().length < 6}>{words === null ? 'Show the words' : 'The wall shows the same words'}</Button>
          {words === null ? null : <Button onClick={() => setWords(null)}>Other words</Button>}
          <Button hotkey="Esc" onClick={onClose}>Leave</Button>
        </div>
      </form>
      <WallList screens={screens.data ?? []} onRevoke={(screenId) => void revoke(screenId)} />
    </ConsoleDialog>
  );
}
