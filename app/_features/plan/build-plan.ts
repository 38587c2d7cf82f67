import type { PlanForm } from '@/app/_features/plan/plan-form';
import { freeSlug, slugOf } from '@/app/_features/plan/slug-of';
import type { CasePlan } from '@/lib/case/plan';
import { pathsFor } from '@/lib/reference/templates/paths-for';

interface Named {
  readonly id: string;
}

/** Ids for rows in their order: the template's own where the name is still the template's, else one made of the new name. */
function idsOf<Row extends Named>(rows: readonly Row[], known: readonly Row[], nameOf: (row: Row) => string, fallback: string): ReadonlyMap<string, string> {
  const ids = new Map<string, string>();
  const taken = new Set<string>();
  const isKept = (row: Row) => known.some((old) => old.id === row.id && nameOf(old) === nameOf(row));
  for (const row of rows) if (isKept(row)) taken.add(row.id);
  for (const row of rows) {
    const id = isKept(row) ? row.id : freeSlug(slugOf(nameOf(row), fallback), taken);
    taken.add(id);
    ids.set(row.id, id);
  }
  return ids;
}

/** The plan as it will be written into the case: fresh ids, sites in order of their positions, every path. */
export function buildPlan({ plan, requiredChannelIds }: PlanForm, template: CasePlan): CasePlan {
  const nerveIds = idsOf(plan.nerves, template.nerves, (nerve) => nerve.name, 'nerve');
  const siteIds = idsOf(plan.nerves.flatMap((nerve) => nerve.sites), template.nerves.flatMap((nerve) => nerve.sites), (site) => site.name, 'site');
  const channelIds = idsOf(plan.channels, template.channels, (channel) => channel.name, 'channel');
  const stepIds = idsOf(plan.steps, template.steps, (step) => step.label, 'step');
  const electrodeIds = idsOf(plan.electrodes, template.electrodes, (electrode) => electrode.name, 'electrode');
  const nerves = plan.nerves.map((nerve) => ({
    ...nerve,
    id: nerveIds.get(nerve.id) ?? nerve.id,
    sites: nerve.sites.map((site) => ({ ...site, id: siteIds.get(site.id) ?? site.id })),
  }));
  const channels = plan.channels.map((channel) => ({
    ...channel,
    id: channelIds.get(channel.id) ?? channel.id,
    longName: channel.longName.trim() === '' ? channel.name : channel.longName,
    nerveId: nerveIds.get(channel.nerveId) ?? channel.nerveId,
  }));
  return {
    ...plan,
    nerves,
    channels,
    paths: pathsFor(nerves, channels, requiredChannelIds.map((id) => channelIds.get(id) ?? id)),
    steps: plan.steps.map((step) => ({ ...step, id: stepIds.get(step.id) ?? step.id, since: sinceOf(step.label, step.since) })),
    electrodes: plan.electrodes.map((electrode) => ({ ...electrode, id: electrodeIds.get(electrode.id) ?? electrode.id })),
    closingSiteId: siteIds.get(plan.closingSiteId) ?? nerves[0]?.sites[0]?.id ?? plan.closingSiteId,
  };
}

/** What reads after "since": what was typed, else the label with a small first letter. */
function sinceOf(label: string, since: string): string {
  return since.trim() === '' ? label.charAt(0).toLowerCase() + label.slice(1) : since;
}
