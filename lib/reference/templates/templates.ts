import type { CasePlan } from '@/lib/case/plan';
import { sciaticAtHip } from '@/lib/reference/templates/sciatic-at-hip';
import { ulnarAtElbow } from '@/lib/reference/templates/ulnar-at-elbow';

/**
 * Procedure templates that a case can be planned from. A plan is copied into the case, never joined live.
 *
 * @returns plans, the most usual first
 * @source house rule; each template names its own sources
 * @accuracy exact; tests/lib/reference/templates/templates.test.ts
 * @example
 * templates[0]?.templateId // => 'ulnar-at-elbow'
 */
export const templates: readonly CasePlan[] = [ulnarAtElbow, sciaticAtHip];
