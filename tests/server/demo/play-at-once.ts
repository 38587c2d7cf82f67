import type { EntryDraft } from '@/lib/case/entry-bodies';
import type { TheatreView } from '@/lib/text/theatre-line';
import { resolveCommand } from '@/server/demo/resolve-command';
import type { Scenario } from '@/server/demo/scenario';
import { CaseBuilder } from '@/tests/support/case-builder';

/** One act of a case played without a server, with what it left behind. */
export interface PlayedAct {
  readonly index: number;
  readonly heading: string;
  readonly at: string;
  readonly drafts: readonly EntryDraft[];
  readonly view: TheatreView;
}

/** A case played through `decide` alone: waits only move the clock, the server's timers come each second. */
export interface PlayedCase {
  readonly script: CaseBuilder;
  readonly acts: readonly PlayedAct[];
}

/** Plays a scenario; a higher speed compresses its waits as the player does, and no two acts share a millisecond. */
export function playAtOnce({ plan, moments }: Scenario, speed = 1): PlayedCase {
  const script = new CaseBuilder(plan);
  script.give({ name: 'plan-case', plan, reference: 'K7-0001', identityCommitment: 'c'.repeat(64) });
  const acts: PlayedAct[] = [];
  let heading = '';
  for (const [index, moment] of moments.entries()) {
    waitWithTimers(script, Math.max(2, Math.round((1000 * moment.afterSeconds) / speed)));
    heading = moment.heading ?? heading;
    const role = moment.by === 'physician' ? { role: 'physician' } : {};
    const command = resolveCommand(moment.command, script.state);
    if (command === null) throw new Error(`Nothing waits for act ${index}, ${moment.command.name}.`);
    const drafts = script.give(command, role);
    acts.push({ index, heading, at: new Date(script.nowMs).toISOString(), drafts, view: script.view() });
  }
  return { script, acts };
}

function waitWithTimers(script: CaseBuilder, waitMs: number): void {
  for (let leftMs = waitMs; leftMs > 0; leftMs -= 1000) {
    script.wait(Math.min(1000, leftMs));
    script.timers();
  }
}
