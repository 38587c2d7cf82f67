import type { CaseState } from '@/lib/case/case-state';
import type { CaseCommand } from '@/lib/case/commands';
import { sayThis } from '@/lib/text/say-this';
import type { DemoCommand } from '@/server/demo/scenario';

/**
 * A command as it is sent: what the scenario left open is taken from the case as it stands. Null when nothing waits for
 * it any more: somebody at a screen was quicker.
 */
export function resolveCommand(command: DemoCommand, state: CaseState): CaseCommand | null {
  switch (command.name) {
    case 'confirm-advice': {
      const adviceSeq = newestSeq(state.advice.filter((advice) => advice.confirmedAt === null));
      return adviceSeq === null ? null : { ...command, adviceSeq };
    }
    case 'confirm-baseline': {
      const baselineSeq = newestSeq(Object.values(state.baselines).filter((baseline) => baseline.isProvisional));
      return baselineSeq === null ? null : { ...command, baselineSeq };
    }
    case 'tell-alert': {
      const incident = Object.values(state.incidents).find((open) => open.alertId === command.alertId);
      return incident === undefined ? null : { ...command, words: sayThis(state, incident) };
    }
    default:
      return command;
  }
}

function newestSeq(waiting: readonly { readonly seq: number }[]): number | null {
  return waiting.length === 0 ? null : Math.max(...waiting.map(({ seq }) => seq));
}
