import type { Nerve } from '@/lib/alert/nerve-plan';
import type { CasePlan } from '@/lib/case/plan';
import { pathIdOf } from '@/lib/case/keys';
import { spacingProblem } from '@/lib/case/spacing-problem';
import type { RuleSet } from '@/lib/alert/rule-set';
import { consoleKeys, isConsoleKey } from '@/lib/case/console-keys';

/**
 * What does not fit together in a plan, as a sentence.
 * @param plan each field inside its bounds
 * @returns the first problem found; null when the plan can be monitored
 * @source house rule; a control path outside the operation is common practice and is asked for on the screen, not here
 * @accuracy tests/lib/case/plan-problem.test.ts
 * @example
 * planProblem(plan) // => null
 */
export function planProblem(plan: CasePlan): string | null {
  return idProblem(plan) ?? siteProblem(plan) ?? pathProblem(plan) ?? keyProblem(plan) ?? rulesProblem(plan.rules);
}

function twice(values: readonly string[]): string | null {
  return values.find((value, index) => values.indexOf(value) !== index) ?? null;
}

function idProblem(plan: CasePlan): string | null {
  const sites = plan.nerves.flatMap((nerve) => nerve.sites);
  const lists: readonly (readonly [string, readonly string[]])[] = [
    ['Nerve', plan.nerves.map((nerve) => nerve.id)],
    ['Site', sites.map((site) => site.id)],
    ['Channel', plan.channels.map((channel) => channel.id)],
    ['Step', plan.steps.map((step) => step.id)],
    ['Electrode', plan.electrodes.map((electrode) => electrode.id)],
    ['Path', plan.paths.map((path) => path.id)],
    ['Site name', plan.nerves.flatMap((nerve) => nerve.sites.map((site) => `${nerve.name} ${site.name}`))],
  ];
  for (const [noun, ids] of lists) {
    const id = twice(ids);
    if (id !== null) return `${noun} twice: ${id}. Each needs a name of its own`;
  }
  return null;
}

function siteProblem(plan: CasePlan): string | null {
  for (const nerve of plan.nerves) {
    const spacing = spacingProblem(nerve.name, nerve.sites.map((site) => site.positionMm));
    if (spacing !== null) return spacing;
    const behind = plan.channels.find((channel) => channel.nerveId === nerve.id && channel.positionMm <= lastPosition(nerve));
    if (behind !== undefined && behind.kind === 'muscle') {
      return `Channel ${behind.name} at ${behind.positionMm} mm lies before the last site of ${nerve.name}: a muscle lies distal to every site`;
    }
  }
  const stray = plan.channels.find((channel) => !plan.nerves.some((nerve) => nerve.id === channel.nerveId));
  if (stray !== undefined) return `Channel ${stray.name} names no nerve of the plan: ${stray.nerveId}`;
  if (!plan.nerves.some((nerve) => nerve.role === 'at-risk')) return 'No nerve at risk: at least one nerve must be monitored';
  return null;
}

function lastPosition(nerve: Nerve): number {
  return nerve.sites.at(-1)?.positionMm ?? 0;
}

function pathProblem(plan: CasePlan): string | null {
  for (const path of plan.paths) {
    const nerve = plan.nerves.find((candidate) => candidate.id === path.nerveId);
    if (nerve === undefined) return `Path ${path.id} names no nerve of the plan: ${path.nerveId}`;
    if (!nerve.sites.some((site) => site.id === path.siteId)) return `Path ${path.id} names no site of ${nerve.name}: ${path.siteId}`;
    if (!plan.channels.some((channel) => channel.id === path.channelId)) return `Path ${path.id} names no channel of the plan: ${path.channelId}`;
    if (path.id !== pathIdOf(path.siteId, path.channelId)) return `Path ${path.id} must be called ${pathIdOf(path.siteId, path.channelId)}`;
  }
  for (const nerve of plan.nerves.filter((candidate) => candidate.role === 'at-risk')) {
    if (!plan.paths.some((path) => path.nerveId === nerve.id && path.isRequired)) {
      return `No required path on ${nerve.name}: without one nothing could ever be called stable`;
    }
  }
  if (!plan.nerves.some((nerve) => nerve.sites.some((site) => site.id === plan.closingSiteId))) {
    return `Closing site unknown: ${plan.closingSiteId} is no site of the plan`;
  }
  return null;
}

function keyProblem(plan: CasePlan): string | null {
  const siteKeys = plan.nerves.flatMap((nerve) => nerve.sites.map((site) => site.hotkey)).filter((key) => key !== null);
  const stepKeys = plan.steps.map((step) => step.hotkey).filter((key) => key !== null);
  const key = twice(siteKeys) ?? twice(stepKeys);
  if (key !== null) return `Key twice: ${key}. Each site and each step needs a key of its own, or none`;
  const notDigit = siteKeys.find((siteKey) => !/^[0-9]$/.test(siteKey));
  if (notDigit !== undefined) return `Key of a site must be a digit: ${notDigit}`;
  const reserved = stepKeys.find((stepKey) => /^[0-9]$/.test(stepKey) || isConsoleKey(stepKey));
  if (reserved !== undefined) return `Key of a step taken: ${reserved}. The console needs ${Object.keys(consoleKeys).join(', ')} and the digits`;
  return null;
}

/** Limits that contradict one another: a loss that no limit reaches, or a recovery that no response can reach. */
function rulesProblem(rules: RuleSet): string | null {
  const { amplitudeWatchFallPercent: watch, amplitudeNoticeFallPercent: notice, recoveryMarginPercent: margin } = rules;
  if (watch > notice) return `Limits out of order: the watch at −${watch} % must not lie beyond the notice at −${notice} %`;
  if (100 - notice < rules.lostBelowPercent) {
    return `Limits out of order: lost under ${rules.lostBelowPercent} % of baseline must lie beyond the notice at −${notice} %`;
  }
  if (margin >= notice || margin >= rules.onsetNoticeRisePercent) {
    return `Recovery margin of ${margin} % too wide: it must be smaller than the limits for amplitude and onset`;
  }
  return null;
}
