import type { CasePlan } from '@/lib/case/plan';
import type { PlanCaseRequest } from '@/lib/contracts/http/commands';
import { templates } from '@/lib/reference/templates/templates';

/** What the plan page holds while it is filled in. Ids are keys of the page; the plan's own ids are made when it is sent. */
export interface PlanForm {
  plan: CasePlan;
  identity: PlanCaseRequest['identity'];
  /** Where it is planned: asked only of a person of several hospitals. */
  hospitalId: string;
  /** Keys of the channels that calm depends on. */
  requiredChannelIds: string[];
}

/** The form as a template fills it, with what was chosen already kept. */
export function formFromTemplate(template: CasePlan, kept?: Pick<PlanForm, 'identity' | 'hospitalId'> & { side: CasePlan['side']; theatre: string }): PlanForm {
  const required = template.paths.filter((path) => path.isRequired).map((path) => path.channelId);
  const side = kept?.side ?? template.side;
  return {
    plan: { ...template, side, theatre: kept?.theatre ?? '', title: titleForSide(template.title, side) },
    identity: kept?.identity ?? { patientLabel: '', recordNumber: '' },
    hospitalId: kept?.hospitalId ?? '',
    requiredChannelIds: [...new Set(required)],
  };
}

/** A title that begins with a side, with the other side. */
export function titleForSide(title: string, side: CasePlan['side']): string {
  return title.replace(/^(left|right)\b/i, side === 'left' ? 'Left' : 'Right');
}

/** The template of an id; the first one when there is no such template. */
export function templateOf(templateId: string): CasePlan {
  const [first] = templates;
  const found = templates.find((template) => template.templateId === templateId) ?? first;
  if (found === undefined) throw new Error('No template is there to plan from');
  return found;
}
