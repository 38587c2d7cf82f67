import { CaseClient, type Credentials } from '@/server/demo/case-client';
import { demoWelcome, howItStands } from '@/server/demo/demo-words';
import { FollowedCase } from '@/server/demo/followed-case';
import { planDemoCase } from '@/server/demo/plan-demo-case';
import { playScenario } from '@/server/demo/play-scenario';
import type { DemoAuthor, Scenario } from '@/server/demo/scenario';

/** What a demo needs: a server, people who are let in, a case, and where to say what happens. */
export interface Demo {
  readonly url: string;
  readonly people: Readonly<Record<DemoAuthor, Credentials>>;
  readonly scenario: Scenario;
  readonly speed: number;
  readonly stop: AbortSignal;
  readonly print: (line: string) => void;
  readonly reach?: typeof fetch;
}

/** Plans the case, plays it to its end or until it is stopped, and says how it stands. Gives the id of the case. */
export async function playDemo({ url, people, scenario, speed, stop, print, reach }: Demo): Promise<string> {
  const client = new CaseClient(url, stop, reach);
  const { caseId, reference, timeZone } = await planDemoCase(client, people, scenario);
  print(demoWelcome({ url, caseId, reference, scenario, speed }));
  const followed = new FollowedCase(client, caseId, people.desk);
  await followed.catchUp();
  try {
    await playScenario(scenario, { followed, people, timeZone, speed, stop, print });
  } catch (error) {
    // A request in the air ends with the stop; its command may still have been committed, and the log knows.
    if (!stop.aborted) throw error;
  }
  print(howItStands({ state: followed.state, reference, url, isStopped: stop.aborted }));
  return caseId;
}
