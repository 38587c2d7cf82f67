import type { CaseEntry, EntryBodies, Phase } from '@/lib/case/entry-bodies';
import type { CasePlan } from '@/lib/case/plan';
import { actionNames } from '@/lib/text/action-names';
import { alertSentence } from '@/lib/text/alert-sentence';
import { conditionWords } from '@/lib/text/condition-words';
import { decimal, nonBreakingSpace, signed } from '@/lib/text/format';
import { familyNames, judgedSentence, runSentence } from '@/lib/text/run-sentence';
import { examinationSentence } from '@/lib/text/examination-sentence';
import { siteName } from '@/lib/text/site-name';

/** Phases as they are said. */
export const phaseNames: { readonly [P in Phase]: string } = {
  'set-up': 'set-up',
  baseline: 'baseline',
  monitoring: 'monitoring',
  paused: 'paused',
  'take-down': 'take-down',
};

/**
 * One entry of the log in one sentence, in the trade's words.
 *
 * Method: copies what the entry holds; it computes nothing and hides nothing that was measured. Actions have the same
 * names as their buttons. Names of sites and channels come from the plan, or their ids when the plan lacks them.
 *
 * @param entry an entry at the newest version of its kind; not modified
 * @param plan the plan in force
 * @param timeZone IANA zone of the hospital
 * @returns a sentence without a full stop at its end
 * @source house rule; words of the trade, common practice
 * @accuracy tests/lib/text/entry-sentence.test.ts (one promise for each kind)
 * @example
 * entrySentence(entry, plan, 'Europe/London') // => 'Nerve lifted, risk step'
 */
export function entrySentence(entry: CaseEntry, plan: CasePlan, timeZone: string): string {
  switch (entry.kind) {
    case 'case.planned': {
      const { procedure, side, theatre } = entry.body.plan;
      const reference = entry.body.reference ? `, reference ${entry.body.reference}` : '';
      return `Case planned: ${procedure}, ${side} side, ${theatre}${reference}`;
    }
    case 'team.assigned':
      return `Team: ${entry.body.people.map((one) => `${one.role}, ${one.displayName}`).join('; ')}`;
    case 'plan.revised':
      return `Plan revised: ${planCounts(entry.body.plan)}`;
    case 'case.opened':
      return `Case opened${clockWords(entry.body.clockOffsetMs)}`;
    case 'timeout.confirmed':
      return `${actionNames.timeout}: patient and ${entry.body.side} side confirmed${after(entry.body.text)}`;
    case 'phase.changed':
      return `${actionNames.phase}: ${phaseNames[entry.body.phase]}${after(entry.body.reason)}`;
    case 'run.logged':
      return runSentence(entry.body, plan);
    case 'run.judged':
      return judgedSentence(entry.body, plan);
    case 'run.corrected':
      return correctedSentence(entry.body, plan);
    case 'baseline.accepted':
      return baselineSentence(entry.body, plan);
    case 'baseline.confirmed':
      return `${actionNames.baselineConfirmed}, entry ${entry.body.baselineSeq}${after(entry.body.text)}`;
    case 'examination.recorded':
      return examinationSentence(entry.body);
    case 'condition.logged': {
      const { name, value } = conditionWords(entry.body.condition);
      return `${name} ${value}${entry.body.reportedBy === null ? '' : `, as reported by ${entry.body.reportedBy}`}`;
    }
    case 'step.logged':
      return `${entry.body.label}${entry.body.isRisk ? ', risk step' : ''}${entry.body.voidsDistances ? '. Distances void until measured again' : ''}`;
    case 'distances.measured':
      return distancesSentence(entry.body, plan);
    case 'message.sent':
      return `${actionNames.message}: ${entry.body.text}`;
    case 'advice.given':
      return `${actionNames.advice}: ${entry.body.text}`;
    case 'advice.confirmed':
      return `${actionNames.adviceConfirmed}, entry ${entry.body.adviceSeq}${after(entry.body.text)}`;
    case 'case.closed':
      return `Case closed${after(entry.body.text)}`;
    default:
      return alertSentence(entry, plan, timeZone);
  }
}

function after(text: string | null): string {
  return text === null ? '' : `. ${text}`;
}

function planCounts(plan: CasePlan): string {
  const sites = plan.nerves.reduce((count, nerve) => count + nerve.sites.length, 0);
  return `${plan.nerves.length} nerves, ${sites} sites, ${plan.channels.length} channels`;
}

function clockWords(offsetMs: number | null): string {
  if (offsetMs === null) return '. Desk clock not compared with the server';
  if (Math.abs(offsetMs) < 1000) return '';
  const seconds = `${decimal(Math.abs(offsetMs) / 1000, 1)}${nonBreakingSpace}s`;
  return `. Desk clock ${seconds} ${offsetMs > 0 ? 'behind' : 'ahead of'} the server`;
}

function correctedSentence(body: EntryBodies['run.corrected'], plan: CasePlan): string {
  if (body.run === null) return `${actionNames.correction}: run ${body.runSeq} withdrawn. ${body.reason}`;
  return `${actionNames.correction} of run ${body.runSeq}: ${runSentence(body.run, plan)}. Reason: ${body.reason}`;
}

function baselineSentence(body: EntryBodies['baseline.accepted'], plan: CasePlan): string {
  const electrode = plan.electrodes.find((candidate) => candidate.id === body.electrodeId)?.name ?? body.electrodeId;
  const kind = body.isOpening ? 'Opening baseline' : 'Working baseline';
  const provisional = body.isProvisional ? ' provisionally' : '';
  const counts = `${body.pathIds.length} ${body.pathIds.length === 1 ? 'path' : 'paths'} from ${body.runSeqs.length} ${body.runSeqs.length === 1 ? 'run' : 'runs'}`;
  const reason = body.reason === null ? '' : `. Reason: ${body.reason}`;
  const loss = body.setAfterPercent === null ? '' : `. Set after ${signed(body.setAfterPercent, 0)}${nonBreakingSpace}%`;
  return `${kind} accepted${provisional}: ${familyNames[body.family]}, ${electrode}, ${counts}${reason}${loss}`;
}

function distancesSentence(body: EntryBodies['distances.measured'], plan: CasePlan): string {
  const nerve = plan.nerves.find((candidate) => candidate.id === body.nerveId)?.name ?? body.nerveId;
  const list = body.positions.map((row) => `${siteName(plan, row.siteId)} ${row.positionMm}${nonBreakingSpace}mm`).join(', ');
  return `Distances of ${nerve.charAt(0).toLowerCase()}${nerve.slice(1)} measured: ${list}${after(body.reason)}`;
}
