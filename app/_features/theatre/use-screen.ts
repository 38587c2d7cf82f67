'use client';

import { useEffect, useRef, useState } from 'react';

import { ApiFailure } from '@/app/_live/api-failure';
import { askForScreen, readScreen } from '@/app/_live/api';
import type { ScreenReply } from '@/lib/contracts/http/replies';

/** How often a wall asks how it stands. Revocation comes over the live channel at once; this is its second way. */
const askEveryMs = 2000;
/** Set in a browser that has been a wall. */
const askedKey = 'fascicle-wall-asked';

/** How this wall stands: waiting with its code, paired, or not known; with what ended before. */
export interface ScreenStanding {
  readonly reply: Extract<ScreenReply, { kind: 'waiting' | 'paired' }> | null;
  readonly ended: Extract<ScreenReply, { kind: 'ended' }> | null;
  /** Why there is no answer, in a sentence. */
  readonly problem: string | null;
}

/**
 * Asks the server for this wall's code and case, again and again, for as long as the page stands. A wall whose case ended
 * keeps saying so and has its next code at once. A wall without an answer keeps what it had: the live channel, not this
 * question, decides whether its picture is live.
 */
export function useScreen(): ScreenStanding {
  const [standing, setStanding] = useState<ScreenStanding>({ reply: null, ended: null, problem: null });
  const isOver = useRef(false);
  useEffect(() => {
    isOver.current = false;
    let timer: ReturnType<typeof setTimeout> | undefined;
    const ask = async () => {
      const next = await askStanding();
      if (isOver.current) return;
      setStanding((before) => ({
        reply: next.reply ?? (next.problem === null ? null : before.reply),
        ended: next.reply?.kind === 'paired' ? null : (next.ended ?? before.ended),
        problem: next.problem,
      }));
      timer = setTimeout(() => void ask(), askEveryMs);
    };
    void ask();
    return () => {
      isOver.current = true;
      clearTimeout(timer);
    };
  }, []);
  return standing;
}

async function askStanding(): Promise<ScreenStanding> {
  try {
    const reply = hasAskedBefore() ? await readKnownScreen() : await askForScreen();
    rememberAsking();
    if (reply.kind !== 'ended') return { reply, ended: null, problem: null };
    const next = await askForScreen();
    return { reply: next.kind === 'ended' ? null : next, ended: reply, problem: null };
  } catch (failure) {
    const problem = failure instanceof ApiFailure ? failure.message : 'No answer: this screen asks again';
    return { reply: null, ended: null, problem };
  }
}

/** A wall that the server does not know any more asks like a new one. */
async function readKnownScreen(): Promise<ScreenReply> {
  return readScreen().catch((failure: unknown) => {
    const isUnknown = failure instanceof ApiFailure && (failure.kind === 'not-found' || failure.kind === 'not-signed-in');
    if (isUnknown) return askForScreen();
    throw failure;
  });
}

/** A browser that never was a wall is not asked after first: the server would not find it, and the console would call that an error. */
function hasAskedBefore(): boolean {
  try {
    return window.localStorage.getItem(askedKey) !== null;
  } catch {
    return true;
  }
}

function rememberAsking(): void {
  try {
    window.localStorage.setItem(askedKey, 'yes');
  } catch {
    // A wall without storage asks after itself each time; its cookie decides.
  }
}
