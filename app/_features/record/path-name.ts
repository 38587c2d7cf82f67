import { channelOfPath } from '@/lib/case/keys';
import type { CasePlan } from '@/lib/case/plan';
import { channelName } from '@/lib/text/run-sentence';

/** A path as a row names it: "Above elbow to ADM". */
export function pathName(plan: CasePlan, pathId: string): string {
  const siteId = pathId.slice(0, pathId.indexOf('/'));
  return `${siteTitle(plan, siteId)} to ${channelName(plan, channelOfPath(pathId))}`;
}

/** A site as a row names it: "Above elbow". */
export function siteTitle(plan: CasePlan, siteId: string): string {
  return plan.nerves.flatMap((nerve) => nerve.sites).find((candidate) => candidate.id === siteId)?.name ?? siteId;
}
