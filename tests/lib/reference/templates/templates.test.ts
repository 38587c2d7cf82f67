import { describe, expect, it } from 'vitest';

import { planSchema } from '@/lib/contracts/http/plan-schema';
import { consoleKeys, isConsoleKey } from '@/lib/case/console-keys';
import { templates } from '@/lib/reference/templates/templates';

const hotkeysOf = (plan: (typeof templates)[number]) =>
  [...plan.nerves.flatMap((nerve) => nerve.sites), ...plan.steps].flatMap((place) => place.hotkey ?? []);

describe('templates', () => {
  it.each(templates.map((plan) => [plan.templateId, plan] as const))('%s passes the contract of a plan', (_, plan) => {
    expect(planSchema.safeParse(plan).error?.issues ?? []).toEqual([]);
  });

  it.each(templates.map((plan) => [plan.templateId, plan] as const))('%s gives every key to one place only', (_, plan) => {
    const keys = hotkeysOf(plan);
    expect(new Set(keys).size).toBe(keys.length);
    expect(keys.filter(isConsoleKey)).toEqual([]);
  });

  it.each(templates.map((plan) => [plan.templateId, plan] as const))('%s keeps digits for sites and letters for steps', (_, plan) => {
    for (const site of plan.nerves.flatMap((nerve) => nerve.sites)) expect(site.hotkey).toMatch(/^[1-9]$/);
    for (const step of plan.steps) expect(step.hotkey).toMatch(/^[a-z]$/);
  });

  it.each(templates.map((plan) => [plan.templateId, plan] as const))('%s has a control, a closing site that exists, and sites in order', (_, plan) => {
    expect(plan.nerves.some((nerve) => nerve.role === 'control')).toBe(true);
    expect(plan.nerves.flatMap((nerve) => nerve.sites.map((site) => site.id))).toContain(plan.closingSiteId);
    for (const nerve of plan.nerves) {
      const positions = nerve.sites.map((site) => site.positionMm);
      expect(positions).toEqual([...positions].sort((a, b) => a - b));
    }
  });

  it.each(templates.map((plan) => [plan.templateId, plan] as const))('%s requires a path from every site at risk and none of a control', (_, plan) => {
    for (const nerve of plan.nerves) {
      for (const site of nerve.sites) {
        const isRequired = plan.paths.some((path) => path.siteId === site.id && path.isRequired);
        expect(isRequired).toBe(nerve.role === 'at-risk');
      }
    }
  });

  it('ulnar at the elbow has the sites at 0, 150, 250 and 460 mm and ADM at 530 mm', () => {
    const plan = templates.find((template) => template.templateId === 'ulnar-at-elbow');
    expect(plan?.nerves[0]?.sites.map((site) => site.positionMm)).toEqual([0, 150, 250, 460]);
    expect(plan?.channels.find((channel) => channel.id === 'adm')?.positionMm).toBe(530);
  });

  it('ulnar at the elbow voids its distances when the nerve is transposed, and only then', () => {
    const plan = templates.find((template) => template.templateId === 'ulnar-at-elbow');
    expect(plan?.steps.filter((step) => step.voidsDistances).map((step) => step.id)).toEqual(['nerve-transposed']);
  });

  it('sciatic at the hip holds both divisions at risk', () => {
    const plan = templates.find((template) => template.templateId === 'sciatic-at-hip');
    expect(plan?.nerves.filter((nerve) => nerve.role === 'at-risk').map((nerve) => nerve.id)).toEqual(['common-fibular', 'tibial']);
  });
});

describe('isConsoleKey', () => {
  it('knows the keys of the console and nothing inherited', () => {
    expect(Object.keys(consoleKeys).every(isConsoleKey)).toBe(true);
    expect(isConsoleKey('l')).toBe(false);
    expect(isConsoleKey('toString')).toBe(false);
  });
});
