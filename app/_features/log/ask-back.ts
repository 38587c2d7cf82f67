import type { SegmentJudgement } from '@/lib/alert/judgement';
import type { CasePlan } from '@/lib/case/plan';
import { plausibleVelocityMps, velocityPlausibility } from '@/lib/conduction/velocity-plausibility';
import { decimal } from '@/lib/text/format';
import { siteNames } from '@/lib/text/site-name';

/**
 * What to ask before a run with an unlikely velocity is logged. It is never refused: a regenerating nerve conducts slowly.
 * Null when nothing is odd.
 */
export function askBack(segments: readonly SegmentJudgement[], plan: CasePlan): string | null {
  for (const segment of segments) {
    const where = `between ${siteNames(plan, segment.proximalSiteId, segment.distalSiteId)}`;
    const { velocity } = segment;
    if (velocity.kind === 'velocity' && velocity.isImplausible) {
      return `${decimal(velocity.velocityMps, 1)} m/s ${where} over ${velocity.distanceMm} mm. ${causeOf(velocity.velocityMps)}`;
    }
    if (velocity.kind === 'not-computable' && (velocity.reason === 'latencies-exchanged' || velocity.reason === 'latencies-equal')) {
      return `No velocity ${where}: the proximal onset is not later than the distal one. Latencies exchanged, or a wrong site chosen?`;
    }
  }
  return null;
}

function causeOf(velocityMps: number): string {
  const { min, max } = plausibleVelocityMps.value;
  const plausibility = velocityPlausibility(velocityMps);
  if (plausibility !== 'plausible' && plausibility.cause === 'centimetres-typed-as-millimetres') {
    return `Under ${min} m/s: is a distance in centimetres typed as millimetres?`;
  }
  if (velocityMps > max) return `Over ${max} m/s: latencies exchanged, a wrong peak marked, or a distance too long?`;
  return `Under ${min} m/s: a wrong peak marked, or a distance too short?`;
}
