import { expect, it } from 'vitest';

import { alertTimes } from '@/lib/text/alert-times';
import { clock, type CaseBuilder } from '@/tests/support/case-builder';
import { adm, monitoredUlnar } from '@/tests/support/ulnar-case';

const timesOf = (script: CaseBuilder) => Object.fromEntries(alertTimes(script.state, script.state.incidents['ulnar']!, 'UTC').map(({ name, time }) => [name, time]));

function alerted(): CaseBuilder {
  const script = monitoredUlnar().at('10:41');
  script.run('above-elbow', { adm: adm('above-elbow', 0.4, 1.33) });
  script.at('10:41:20').run('above-elbow', { adm: adm('above-elbow', 0.38, 1.38) });
  return script;
}

it('alertTimes leaves open what has not come, in the order in which it comes', () => {
  const script = alerted();
  expect(alertTimes(script.state, script.state.incidents['ulnar']!, 'UTC')).toEqual([
    { name: 'Last good', time: '10:30:02' },
    { name: 'First bad', time: '10:41:00' },
    { name: 'Raised', time: '10:41:20' },
    { name: 'Painted on a wall', time: null },
    { name: 'Told', time: null },
    { name: 'Read back', time: null },
    { name: 'Surgeon’s action', time: null },
    { name: 'Retest', time: null },
  ]);
});

it('alertTimes copies what people did, and takes the first test of the same path after the action as the retest', () => {
  const script = alerted();
  script.at('10:41:22').give({ name: 'note-painted', alertId: 'ulnar-1', entrySeq: script.seq, screenId: 'screen-1', paintedAt: clock('10:41:21') });
  script.at('10:42').give({ name: 'tell-alert', alertId: 'ulnar-1', whom: 'surgeon', how: 'aloud', words: 'Ulnar' });
  script.at('10:42:30').run('above-elbow', { adm: adm('above-elbow', 0.38, 1.38) });
  expect(timesOf(script)).toMatchObject({ 'Painted on a wall': '10:41:21', Told: '10:42:00', Retest: '10:42:30' });
  script.at('10:43').give({ name: 'act-on-alert', alertId: 'ulnar-1', action: 'Traction released' });
  expect(timesOf(script)).toMatchObject({ 'Surgeon’s action': '10:43:00', Retest: null });
  script.at('10:44').run('wrist', { adm: adm('wrist') });
  script.at('10:44:30').run('above-elbow', { adm: { kind: 'not-read' } });
  expect(timesOf(script)['Retest']).toBeNull();
  script.at('10:45').run('above-elbow', { adm: adm('above-elbow', 0.6, 0.9) });
  script.at('10:46').run('above-elbow', { adm: adm('above-elbow', 0.7, 0.9) });
  expect(timesOf(script)['Retest']).toBe('10:45:00');
});
