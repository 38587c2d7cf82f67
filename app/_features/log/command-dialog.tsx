'use client';

import { useEffect, useRef, useState, type FormEvent, type ReactNode } from 'react';

import { ConsoleDialog } from '@/app/_features/log/console-dialog';
import { useLogCase } from '@/app/_features/log/log-context';
import { Button } from '@/app/_ui/button';
import type { PersonCommand } from '@/lib/contracts/http/commands';

/** An Enter so soon after the question opened is the press that opened it, or its echo; what cannot be taken back does not hear it. */
const sameHandMs = 800;

interface CommandDialogProps {
  readonly title: string;
  readonly description?: string;
  readonly action: string;
  readonly isHeavy?: boolean;
  readonly isWide?: boolean;
  readonly canSend?: boolean;
  /** The command as it stands; a string is the sentence that says what is missing. */
  readonly command: () => PersonCommand | string;
  readonly onClose: () => void;
  readonly children: ReactNode;
}

/** A question that ends in one command: Enter gives it once, a refusal is read here and what was typed stays. */
export function CommandDialog({ title, description, action, isHeavy = false, isWide = false, canSend = true, command, onClose, children }: CommandDialogProps) {
  const { give } = useLogCase();
  const [problem, setProblem] = useState<string | null>(null);
  const [isSending, setIsSending] = useState(false);
  const isLocked = useRef(false);
  const openedAtMs = useRef(Infinity);
  const isByPointer = useRef(false);
  useEffect(() => {
    openedAtMs.current = performance.now();
  }, []);
  const handleSubmit = async (event: FormEvent) => {
    event.preventDefault();
    if (isLocked.current || (isHeavy && !isByPointer.current && performance.now() - openedAtMs.current < sameHandMs)) return;
    const made = command();
    if (typeof made === 'string') return setProblem(made);
    isLocked.current = true;
    setIsSending(true);
    const outcome = await give(made);
    isLocked.current = false;
    setIsSending(false);
    if (outcome.kind === 'refused') setProblem(outcome.message);
    else onClose();
  };
  return (
    <ConsoleDialog isOpen onOpenChange={(isOpen) => (isOpen ? undefined : onClose())} title={title} isWide={isWide} {...(description === undefined ? {} : { description })}>
      <form method="post" noValidate onSubmit={(event) => void handleSubmit(event)} onPointerDownCapture={() => void (isByPointer.current = true)} onKeyDownCapture={() => void (isByPointer.current = false)} className="flex flex-col gap-4">
        {children}
        {problem === null ? null : <p role="alert" className="border-l-4 border-ink pl-3 font-semibold">{problem}</p>}
        <div className="flex flex-wrap gap-3">
          <Button type="submit" variant={isHeavy ? 'danger' : 'primary'} hotkey="Enter" disabled={isSending || !canSend}>{action}</Button>
          <Button hotkey="Esc" onClick={onClose}>Leave</Button>
        </div>
      </form>
    </ConsoleDialog>
  );
}
