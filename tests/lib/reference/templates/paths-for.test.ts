import { describe, expect, it } from 'vitest';

import type { Channel, Nerve } from '@/lib/alert/nerve-plan';
import { pathsFor } from '@/lib/reference/templates/paths-for';

const site = (id: string, positionMm: number) => ({ id, name: id, positionMm, hotkey: null, defaultIntensityMa: 10 });
const channel = (id: string, nerveId: string, positionMm: number): Channel => ({
  id, name: id, longName: id, kind: 'muscle', convention: 'baseline-to-peak', nerveId, positionMm,
});
const nerve: Nerve = { id: 'radial', name: 'Radial', role: 'at-risk', sites: [site('groove', 0), site('arcade', 100)] };

describe('pathsFor', () => {
  it('joins each site with each distal channel of its own nerve', () => {
    const paths = pathsFor([nerve], [channel('eip', 'radial', 200), channel('apb', 'median', 200)], ['eip']);
    expect(paths.map((path) => path.id)).toEqual(['groove/eip', 'arcade/eip']);
    expect(paths.every((path) => path.isRequired)).toBe(true);
  });

  it('leaves out a channel at or proximal to the site', () => {
    const paths = pathsFor([nerve], [channel('triceps', 'radial', 100)], []);
    expect(paths).toEqual([{ id: 'groove/triceps', nerveId: 'radial', siteId: 'groove', channelId: 'triceps', isRequired: false }]);
  });
});
