import { commandDoors } from '@/server/doors/command-doors';
import type { Answered, Door, DoorParts } from '@/server/doors/door-parts';
import { queryDoors } from '@/server/doors/query-doors';
import { isFailure, notReadable, notSaved, type Failure } from '@/server/failure';
import type { FascicleGlobal, Reply, RequestSource } from '@/server/fascicle-global';

/** The seam as the routes see it: every door answers, whatever happens behind it. */
export function makeFascicle(parts: DoorParts): FascicleGlobal {
  const named = new Map<string, DoorParts>();
  /** The parts with a log whose every line names the door. */
  const partsOf = (door: string): DoorParts => {
    const known = named.get(door) ?? { ...parts, context: { ...parts.context, log: parts.context.log.child({ door }) } };
    named.set(door, known);
    return known;
  };
  return {
    execute: (name, input, source) => pass(partsOf(name), commandDoors[name] as Door<unknown, never>, input, source, notSaved),
    query: (name, input, source) => pass(partsOf(name), queryDoors[name] as Door<unknown, never>, input, source, notReadable),
  };
}

async function pass<Input, Answer extends object>(
  parts: DoorParts,
  door: Door<Input, Answer>,
  input: Input,
  source: RequestSource,
  faultReply: () => Failure,
): Promise<Reply<Answer>> {
  try {
    const answered = await door(parts, input, source);
    if (hasCookies(answered)) return { isOk: true, status: 200, body: answered.answer, cookies: answered.cookies };
    return { isOk: true, status: 200, body: answered, cookies: [] };
  } catch (thrown) {
    if (!isFailure(thrown)) parts.context.log.error({ err: thrown }, 'A door met a fault.');
    const { status, reply } = isFailure(thrown) ? thrown : faultReply();
    return { isOk: false, status, body: reply, cookies: [] };
  }
}

function hasCookies<Answer extends object>(answered: Answer | Answered<Answer>): answered is Answered<Answer> {
  return 'isAnswered' in answered;
}
