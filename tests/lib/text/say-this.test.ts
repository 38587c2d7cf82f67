import { describe, expect, it } from 'vitest';

import { sayThis } from '@/lib/text/say-this';
import { absent, type CaseBuilder } from '@/tests/support/case-builder';
import { adm, fdiAt, monitoredUlnar } from '@/tests/support/ulnar-case';

const said = (script: CaseBuilder) => sayThis(script.state, script.state.incidents['ulnar']!);

describe('sayThis', () => {
  it('sayThis says once, then where, then since when', () => {
    const script = monitoredUlnar().at('10:41');
    script.step('nerve-lifted');
    script.wait(1000).run('above-elbow', { adm: adm('above-elbow', 0.38) });
    expect(said(script)).toBe('Ulnar, ADM, at 38 per cent of baseline, stimulating at above elbow, since nerve lifted. Once, being repeated.');
    script.wait(1000).run('above-elbow', { adm: adm('above-elbow', 0.38) });
    script.wait(1000).run('below-elbow', { adm: adm('below-elbow') });
    expect(said(script)).toBe('Ulnar, ADM, at 38 per cent of baseline, between above and below elbow, since nerve lifted.');
  });

  it('sayThis says no response, both muscles, and that it was not repeated', () => {
    const script = monitoredUlnar(['adm', 'fdi']).at('10:41');
    script.run('wrist', { adm: absent(20), fdi: fdiAt('wrist', 0.04) });
    script.at('10:41:30').timers();
    expect(said(script)).toBe('Ulnar, ADM and FDI, no response, stimulating at wrist. Not repeated.');
  });

  it('sayThis does not claim a % of baseline for a response that is back at a higher current only', () => {
    const script = monitoredUlnar().at('10:41');
    script.run('wrist', { adm: absent(15) });
    script.wait(1000).run('wrist', { adm: adm('wrist') }, { intensityMa: 30, isSupramaximal: false });
    expect(said(script)).toContain('needs more current than at baseline');
  });
});
