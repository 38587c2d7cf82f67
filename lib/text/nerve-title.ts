import type { CasePlan } from '@/lib/case/plan';

/**
 * What a headline calls a nerve: its name; the only control nerve is "Control".
 * @param plan the plan of the case
 * @param nerveId slug of the nerve
 * @returns the name; the slug when the plan has no such nerve
 * @source house rule
 * @accuracy exact; tests/lib/text/theatre-view.test.ts
 */
export function nerveTitle(plan: CasePlan, nerveId: string): string {
  const nerve = plan.nerves.find((candidate) => candidate.id === nerveId);
  const controls = plan.nerves.filter((candidate) => candidate.role === 'control');
  return nerve?.role === 'control' && controls.length === 1 ? 'Control' : (nerve?.name ?? nerveId);
}

/**
 * A name inside a sentence: first letter small, save where it is an abbreviation such as C5.
 * @param name a name as it stands alone
 * @returns "ulnar", "C5 root"
 * @source house rule
 * @example
 * insideSentence('C5 root') // => 'C5 root'
 */
export function insideSentence(name: string): string {
  return /^.[a-z]/.test(name) ? name.charAt(0).toLowerCase() + name.slice(1) : name;
}
