import { absent, clock, type CaseBuilder } from '@/tests/support/case-builder';
import { adm, apb, monitoredUlnar, testAll, ulnarSites } from '@/tests/support/ulnar-case';

/**
 * A case with every cause of blindness, worked by hand. Monitoring begins at 10:10:00; every ulnar site is tested at
 * 10:30:01 to 10:30:04 by `monitoredUlnar`.
 */
export function blindScript(): CaseBuilder {
  const script = monitoredUlnar();
  script.at('10:40').step('nerve-lifted');
  script.at('10:42');
  testAll(script);
  script.at('10:44').give({ name: 'change-phase', phase: 'paused', reason: 'Image intensifier' });
  script.at('10:45').give({ name: 'change-phase', phase: 'monitoring', reason: null });
  script.at('10:46').run('above-elbow', { adm: adm('above-elbow', 0.9) }, { intensityMa: 9, isSupramaximal: false });
  script.at('10:46:30').run('above-elbow', { adm: adm('above-elbow', 0.97) });
  script.at('10:50').give({ name: 'change-phase', phase: 'baseline', reason: 'Arm moved' });
  script.at('10:51').give({ name: 'change-phase', phase: 'monitoring', reason: null });
  script.at('10:52');
  for (const site of ulnarSites) script.wait(1000).run(site, { adm: absent(20) });
  script.wait(1000).run('median-wrist', { apb: absent(20) });
  script.at('10:54');
  for (const site of ulnarSites) script.wait(1000).run(site, { adm: adm(site) });
  script.wait(1000).run('median-wrist', { apb: apb() });
  script.at('10:59').run('wrist', { adm: adm('wrist') }, {}, { eventAt: clock('10:57') });
  script.at('11:05').give({ name: 'change-phase', phase: 'take-down', reason: null });
  return script;
}
