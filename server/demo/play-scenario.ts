import { v7 as newId } from 'uuid';

import { theatreView } from '@/lib/text/theatre-view';
import type { Credentials } from '@/server/demo/case-client';
import type { FollowedCase } from '@/server/demo/followed-case';
import { pause } from '@/server/demo/pause';
import { resolveCommand } from '@/server/demo/resolve-command';
import type { DemoAuthor, Moment, Scenario } from '@/server/demo/scenario';
import { stepLine } from '@/server/demo/step-line';

/** What a playing needs besides its scenario. */
export interface Stage {
  readonly followed: FollowedCase;
  readonly people: Readonly<Record<DemoAuthor, Credentials>>;
  readonly timeZone: string;
  readonly speed: number;
  readonly stop: AbortSignal;
  readonly print: (line: string) => void;
}

/** Plays every act of a case that was planned, until its end or until it is told to stop. */
export async function playScenario({ moments }: Scenario, stage: Stage): Promise<void> {
  let lastAt = '';
  for (const moment of moments) {
    await pause((1000 * moment.afterSeconds) / stage.speed, stage.stop);
    // Two acts never share a millisecond: a run is after its baseline or before it.
    while (!stage.stop.aborted && new Date().toISOString() <= lastAt) await pause(1, stage.stop);
    if (stage.stop.aborted) return;
    lastAt = new Date().toISOString();
    if (moment.heading !== null) stage.print(`\n${moment.heading}`);
    await playMoment(moment, lastAt, stage);
    if (stage.followed.state.status === 'closed') return;
  }
}

async function playMoment(moment: Moment, at: string, stage: Stage): Promise<void> {
  const { followed, people, timeZone, print } = stage;
  const before = await followed.catchUp();
  const command = resolveCommand(moment.command, followed.state);
  const answer = command === null ? null : await followed.give({ commandId: newId(), eventAt: at, command }, people[moment.by]);
  const entries = [...before, ...(await followed.catchUp())];
  const view = theatreView(followed.state, Date.now(), timeZone);
  if (entries.length > 0) print(stepLine({ entries, plan: followed.state.plan, view, timeZone, at }));
  if (command === null) print(`          Left out, nothing waits for it any more: ${moment.command.name}.`);
  if (answer?.isOk === false) print(`          Refused: ${answer.refusal.message}.`);
}
