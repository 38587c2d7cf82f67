import type { SendOutcome } from '@/app/_live/live-client';
import { dismissRefused, sendCommand } from '@/app/_live/send-command';
import type { PersonCommand } from '@/lib/contracts/http/commands';

/** Gives a command. A refusal is read where the command was given, so it does not stand in the list of refused ones too. */
export async function giveCommand(caseId: string, command: PersonCommand): Promise<SendOutcome> {
  try {
    const outcome = await sendCommand(caseId, command);
    if (outcome.kind === 'refused' && outcome.commandId !== null) await dismissRefused(outcome.commandId);
    return outcome;
  } catch (cause) {
    const message = cause instanceof Error ? cause.message : 'Not kept: this browser could not store the entry';
    return { kind: 'refused', code: 'not-kept', message, field: null, commandId: null };
  }
}
