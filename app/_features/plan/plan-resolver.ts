import { zodResolver } from '@hookform/resolvers/zod';
import type { Resolver } from 'react-hook-form';

import { buildPlan } from '@/app/_features/plan/build-plan';
import { templateOf, type PlanForm } from '@/app/_features/plan/plan-form';
import { planProblem } from '@/lib/case/plan-problem';
import { planCaseRequestSchema } from '@/lib/contracts/http/commands';

const schema = planCaseRequestSchema.pick({ plan: true, identity: true });

/** Checks the plan as it will be sent: each field by the contract, then how its parts fit together. */
export const planResolver: Resolver<PlanForm> = async (form, context, options) => {
  const plan = buildPlan(form, templateOf(form.plan.templateId));
  const resolve = zodResolver(schema) as unknown as Resolver<PlanForm>;
  const result = await resolve({ plan, identity: form.identity } as PlanForm, context, options);
  if (Object.keys(result.errors).length > 0) return result;
  const problem = planProblem(plan);
  if (problem !== null) return { values: {}, errors: { root: { type: 'plan', message: problem } } };
  return { values: { ...form, plan }, errors: {} };
};
