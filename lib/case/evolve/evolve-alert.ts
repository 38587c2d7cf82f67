import type { CaseState, Incident } from '@/lib/case/case-state';
import type { AlertEvidence, CaseEntry } from '@/lib/case/entry-bodies';
import { returned, segmentsOfRun, withRun } from '@/lib/case/evolve/evidence-runs';

type AlertEntry = CaseEntry & {
  kind:
    | 'notice.raised' | 'notice.settled' | 'alert.raised' | 'alert.worsened' | 'alert.located' | 'alert.recovered'
    | 'alert.painted' | 'alert.withdrawn' | 'alert.told' | 'alert.read-back' | 'alert.acted' | 'alert.ended';
};

/** Withdrawn alerts the state remembers; a wall names them for a minute. */
const keptWithdrawn = 5;

/** Opens, updates and ends the one incident of a nerve. @returns the state after it @source house rule: one alert per nerve */
export function evolveAlert(state: CaseState, entry: AlertEntry): CaseState {
  if (entry.kind === 'notice.raised') {
    const open = state.incidents[entry.body.nerveId];
    if (open?.alertId === entry.body.alertId) return withIncident(state, askedAnew(open, entry));
    const count = (state.alertCounts[entry.body.nerveId] ?? 0) + 1;
    return withIncident({ ...state, alertCounts: { ...state.alertCounts, [entry.body.nerveId]: count } }, opened(state, entry));
  }
  const incident = Object.values(state.incidents).find((open) => open.alertId === entry.body.alertId);
  if (incident === undefined) return state;
  switch (entry.kind) {
    case 'notice.settled':
    case 'alert.ended':
      return withoutIncident(state, incident.nerveId);
    case 'alert.withdrawn': {
      const withdrawn = { alertId: incident.alertId, nerveId: incident.nerveId, at: entry.recordedAt };
      return { ...withoutIncident(state, incident.nerveId), withdrawn: [...state.withdrawn, withdrawn].slice(-keptWithdrawn) };
    }
    default:
      return withIncident(state, updated(state, incident, entry));
  }
}

function opened(state: CaseState, entry: CaseEntry & { kind: 'notice.raised' }): Incident {
  return {
    ...evidenceFields(entry.body),
    alertId: entry.body.alertId,
    nerveId: entry.body.nerveId,
    level: 'notice',
    isRepeated: false,
    firstSeq: entry.body.runSeq,
    badSeqs: [entry.body.runSeq],
    badPathIds: entry.body.pathIds,
    badSegments: segmentsOfRun(state, entry.body),
    mayBecomeAlert: entry.body.repeatDueAt !== null,
    locateFromSeq: entry.body.runSeq,
    locateFromAt: entry.body.firstBadAt,
    receivedAt: entry.recordedAt,
    raisedAt: entry.recordedAt,
    ...unpainted(entry),
    repeatDueAt: entry.body.repeatDueAt,
    toldAt: null,
    toldPercentOfBaseline: null,
    readBackAt: null,
    actedAt: null,
    action: null,
    recoveredAt: null,
  };
}

/** A graver finding on a nerve whose notice could not become an alert: the same notice, with a repeat of its own. */
function askedAnew(incident: Incident, entry: CaseEntry & { kind: 'notice.raised' }): Incident {
  const { repeatDueAt } = entry.body;
  const told = { toldAt: null, readBackAt: null };
  return { ...incident, ...evidenceFields(entry.body), ...told, ...unpainted(entry), raisedAt: entry.recordedAt, repeatDueAt, mayBecomeAlert: repeatDueAt !== null };
}

/** New words of an alert: no wall has shown them yet. */
function unpainted(entry: CaseEntry) {
  return { raisedSeq: entry.seq, paintedAt: null };
}

function evidenceFields(body: AlertEvidence) {
  return {
    firstBadAt: body.firstBadAt,
    finding: body.finding,
    pathIds: body.pathIds,
    worstPercentOfBaseline: body.worstPercentOfBaseline,
    isLost: body.finding === 'response-lost',
    location: body.location,
    lastGoodAt: body.lastGoodAt,
    stepsBetween: body.stepsBetween,
  };
}

function updated(
  state: CaseState,
  incident: Incident,
  entry: Exclude<AlertEntry, { kind: 'notice.raised' | 'notice.settled' | 'alert.ended' | 'alert.withdrawn' }>,
): Incident {
  switch (entry.kind) {
    case 'alert.raised':
      return {
        ...incident,
        ...evidenceFields(entry.body),
        ...unpainted(entry),
        ...withRun(state, incident, entry.body),
        level: 'alert',
        isRepeated: entry.body.isRepeated,
        raisedAt: incident.level === 'alert' ? incident.raisedAt : entry.recordedAt,
        receivedAt: entry.body.firstBadAt < incident.firstBadAt ? entry.recordedAt : incident.receivedAt,
        repeatDueAt: null,
        // What was told of the notice was not yet told of the alert.
        toldAt: incident.level === 'alert' ? incident.toldAt : null,
        readBackAt: incident.level === 'alert' ? incident.readBackAt : null,
      };
    case 'alert.worsened':
      return {
        ...incident,
        ...evidenceFields(entry.body),
        ...unpainted(entry),
        isLost: incident.isLost || entry.body.finding === 'response-lost',
        ...(entry.body.worsening.includes('returned') ? returned(state, entry) : {}),
        toldAt: null,
        readBackAt: null,
        actedAt: null,
        action: null,
        recoveredAt: null,
      };
    case 'alert.painted':
      return { ...incident, paintedAt: entry.body.paintedAt };
    case 'alert.located':
      return { ...incident, location: entry.body.location };
    case 'alert.recovered':
      return { ...incident, recoveredAt: entry.eventAt };
    case 'alert.told':
      return { ...incident, toldAt: entry.eventAt, toldPercentOfBaseline: incident.worstPercentOfBaseline };
    case 'alert.read-back':
      return { ...incident, readBackAt: entry.eventAt };
    case 'alert.acted':
      return { ...incident, actedAt: entry.eventAt, action: entry.body.action };
  }
}

function withIncident(state: CaseState, incident: Incident): CaseState {
  return { ...state, incidents: { ...state.incidents, [incident.nerveId]: incident } };
}

function withoutIncident(state: CaseState, nerveId: string): CaseState {
  const { [nerveId]: _ended, ...incidents } = state.incidents;
  return { ...state, incidents };
}
