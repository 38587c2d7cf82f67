import { decide } from '@/lib/case/decide';
import { evolve } from '@/lib/case/evolve';
import { initialState } from '@/lib/case/initial-state';
import type { CaseState } from '@/lib/case/case-state';
import type { CaseCommand } from '@/lib/case/commands';
import type { CasePlan } from '@/lib/case/plan';
import type { RunBody } from '@/lib/case/run-body';
import type { Reading } from '@/lib/response/reading';

const author = { id: 'neurophysiologist', role: 'neurophysiologist', displayName: 'Neurophysiologist' };

/** "10:41:20" of the gallery's day as a moment. The day is in winter, so that a clock in London shows the same. */
export function momentAt(time: string): string {
  return `2027-01-14T${time}.000Z`;
}

/** Plays commands through the product's own decide and evolve, as a desk would give them. */
export class CaseScript {
  state: CaseState = initialState('00000000-0000-7000-8000-000000000001');

  /** Gives one command at a time of the day. @throws {Error} when the case refuses it, with its sentence */
  give(time: string, command: CaseCommand): this {
    const eventAt = momentAt(time);
    const decision = decide(this.state, command, { eventAt, nowMs: Date.parse(eventAt) });
    if (decision.kind === 'refused') throw new Error(`${time} ${command.name}: ${decision.refusal.message}`);
    for (const draft of decision.drafts) {
      const seq = this.state.seq + 1;
      this.state = { ...evolve(this.state, { ...draft, seq, eventAt, recordedAt: eventAt, commandId: `command-${seq}`, author }), seq };
    }
    return this;
  }

  /** One run: current, then for each channel onset in ms and amplitude in mV, or "absent". */
  run(time: string, siteId: string, intensityMa: number, channels: Readonly<Record<string, readonly [number, number] | 'absent'>>, run: Partial<RunBody> = {}): this {
    const readings = Object.entries(channels).map(([channelId, value]) => ({ channelId, reading: readingOf(value, intensityMa) }));
    const body: RunBody = {
      siteId,
      electrodeId: this.state.plan.electrodes[0]?.id ?? 'surface',
      family: this.state.plan.defaultFamily,
      purpose: 'check',
      intensityMa,
      pulseWidthUs: this.state.plan.defaultPulseWidthUs,
      isSupramaximal: true,
      maximalResponseMa: null,
      readings,
      note: null,
      ...run,
    };
    return this.give(time, { name: 'log-run', run: body });
  }

  /** Planned, opened, timed out and in the baseline phase. */
  static opened(plan: CasePlan, time = '09:31:00'): CaseScript {
    return new CaseScript()
      .give('09:00:00', { name: 'plan-case', plan, reference: 'FSC-0001-K', identityCommitment: '0'.repeat(64) })
      .give(time, { name: 'open-case', clockOffsetMs: 0 })
      .give('09:32:00', { name: 'confirm-timeout', side: plan.side, text: null })
      .give('09:33:00', { name: 'change-phase', phase: 'baseline', reason: null })
      .give('09:33:30', { name: 'log-condition', condition: { kind: 'train-of-four', count: 4, ratio: 0.95 }, reportedBy: 'anaesthetist' })
      .give('09:33:40', { name: 'log-condition', condition: { kind: 'tourniquet', isUp: false, pressureMmHg: null }, reportedBy: 'anaesthetist' });
  }
}

function readingOf(value: readonly [number, number] | 'absent', intensityMa: number): Reading {
  if (value === 'absent') return { kind: 'absent', highestIntensityMa: intensityMa };
  return { kind: 'measured', onsetMs: value[0], amplitudeUv: value[1] * 1000, durationMs: 5.6 };
}
