import { describe, expect, it } from 'vitest';

import { theatreFooter } from '@/lib/text/theatre-footer';
import { adm, monitoredUlnar, testAll } from '@/tests/support/ulnar-case';

describe('theatreFooter', () => {
  it('asks for the site that the headline asks for while a change is not located', () => {
    const script = monitoredUlnar().at('10:31');
    script.step('nerve-lifted');
    script.wait(1000).run('above-elbow', { adm: adm('above-elbow', 0.4, 1.33) });
    expect(script.view().lead.detail).toMatch(/test below elbow next/);
    expect(theatreFooter(script.state, script.nowMs, 'UTC')).toContain('First to test: below elbow');
  });

  it('asks for the first untested site while nothing is open', () => {
    const script = monitoredUlnar().at('10:31');
    script.step('nerve-lifted');
    expect(theatreFooter(script.state, script.nowMs, 'UTC')).toContain('First to test: axilla');
  });

  it('says one fact once, also for two nerves at risk', () => {
    const script = monitoredUlnar();
    testAll(script);
    const nerves = script.state.plan.nerves.map((nerve) => ({ ...nerve, role: 'at-risk' as const }));
    const paths = script.state.plan.paths.map((path) => ({ ...path, isRequired: path.isRequired || path.channelId === 'apb' }));
    const facts = theatreFooter({ ...script.state, plan: { ...script.state.plan, nerves, paths } }, script.nowMs, 'UTC');
    expect(facts.filter((fact) => fact.startsWith('Next test by'))).toEqual(['Next test by 10:35']);
  });
});
