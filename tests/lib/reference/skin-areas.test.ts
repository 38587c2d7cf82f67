import { expect, it } from 'vitest';

import { skinAreas } from '@/lib/reference/skin-areas';
import { templates } from '@/lib/reference/templates/templates';

it('skinAreas names an area once, with its origin, for every nerve at risk of the templates', () => {
  expect(new Set(skinAreas.map((row) => row.area)).size).toBe(skinAreas.length);
  for (const row of skinAreas) expect(row.source).toBe('memory');
  const atRisk = templates.flatMap((template) => template.nerves).filter((nerve) => nerve.role === 'at-risk');
  expect(atRisk.length).toBeGreaterThan(0);
  for (const nerve of atRisk) expect(skinAreas.some((row) => nerve.name.toLowerCase().includes(row.nerve)), nerve.name).toBe(true);
});
