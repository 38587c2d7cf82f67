import type { CasePlan } from '@/lib/case/plan';
import { ulnarAtElbow } from '@/lib/reference/templates/ulnar-at-elbow';
import { armControl, armNerves, armThroughSkin, onNerve, ulnarSites } from '@/server/demo/arm';
import { beginCase, endCase } from '@/server/demo/begin-case';
import { chargeUc, comingBack, referenceC } from '@/server/demo/nerve-model';
import type { Scenario } from '@/server/demo/scenario';
import { ScenarioScript } from '@/server/demo/scenario-script';

const plan: CasePlan = { ...ulnarAtElbow, title: 'Left ulnar nerve, transposition', side: 'left', theatre: 'Theatre 2' };

/** Where the nerve is pulled on when it is lifted: between the sites above and below the elbow. */
const stretched = { fromMm: 185, toMm: 215 };

function story(): ScenarioScript {
  const script = new ScenarioScript(plan, armNerves, armThroughSkin);
  prepare(script);
  coolingEpisode(script);
  exposure(script);
  lifting(script);
  transposition(script);
  endCase(script, {
    sites: [...ulnarSites, armControl],
    words: () => `Closing runs done. From the axilla ADM stands at ${script.percent('axilla', 'adm')} of baseline, the control at ${script.percent(armControl, 'apb')}.`,
    closeText: 'Responses present from every site at the end. Needles out, skin intact.',
  });
  return script;
}

function prepare(script: ScenarioScript): void {
  beginCase(script, {
    examination: {
      muscles: [
        { muscle: 'Abductor digiti minimi', grade: 4 },
        { muscle: 'First dorsal interosseous', grade: 4 },
        { muscle: 'Abductor pollicis brevis', grade: 5 },
      ],
      sensation: [
        { area: 'Little finger', finding: 'reduced' },
        { area: 'Tip of the index finger', finding: 'normal' },
      ],
      text: 'Ulnar neuropathy at the elbow on the left.',
    },
    greeting: 'Theatre 2, left ulnar nerve, anterior transposition. Can you follow?',
    limbC: referenceC,
  });
  script.part('Baseline through the skin');
  script.phase('baseline');
  script.baselineRuns([...ulnarSites, armControl]);
  script.acceptBaseline('surface', 'through-skin', 'Clear responses, slow across the elbow as expected');
  script.phase('monitoring');
  script.runs([...ulnarSites, armControl]);
  script.step('incision', 20);
}

/**
 * The arm cools by 3 °C: every time is longer on both nerves, no amplitude falls. Then it is warmed. The desk tests all the
 * while, so that no two runs of a pair are far apart in temperature.
 */
function coolingEpisode(script: ScenarioScript): void {
  const [coldC, warmC] = [referenceC - 3, referenceC - 0.2];
  script.part('The arm cools');
  limbDrifts(script, coldC);
  script.message('desk', `Every response is later, the control too. Limb ${coldC} °C, it was ${referenceC} °C. ADM from the axilla at ${script.percent('axilla', 'adm')} of baseline.`);
  script.advice('Uniform, control included, amplitudes kept: this reads as cooling. Warm the arm and go on testing until it is warm.', 'Warm irrigation and blanket on');
  limbDrifts(script, warmC);
}

/** Three rounds while the limb drifts, a quarter of a degree from run to run at most, and one when it has arrived. */
function limbDrifts(script: ScenarioScript, toC: number): void {
  const fromC = script.acting.temperatureC;
  const rounds = 3 * ulnarSites.length;
  for (let count = 1; count <= rounds; count += 1) {
    script.acting = { ...script.acting, temperatureC: fromC + ((toC - fromC) * count) / rounds };
    script.run(ulnarSites[(count - 1) % ulnarSites.length] ?? 'wrist', { after: 7 });
  }
  script.condition({ kind: 'limb-temperature', temperatureC: toC });
  script.runs([...ulnarSites, armControl], { after: 7 });
}

function exposure(script: ScenarioScript): void {
  script.part('Nerve exposed, baseline on the nerve');
  script.step('neurolysis', 25);
  script.stimuli['above-elbow'] = onNerve;
  script.stimuli['below-elbow'] = onNerve;
  const { intensityMa, pulseWidthUs } = onNerve;
  script.baselineRuns(['below-elbow', 'above-elbow'], `On the nerve, ${intensityMa} mA × ${pulseWidthUs} µs = ${chargeUc(intensityMa, pulseWidthUs).toFixed(2)} µC`);
  script.acceptBaseline('direct-bipolar', 'exposed', 'Agree with the exposed baseline');
  script.runs(ulnarSites);
}

/** The loop pulls: fibres stop conducting between the elbow sites, and come back when it is let go. */
function lifting(script: ScenarioScript): void {
  script.part('Nerve lifted');
  script.step('nerve-lifted', 20);
  const pulled = (conductingShare: number) => ({ ...script.acting, lesions: [{ ...stretched, conductingShare, delayMs: 0.3 * (1 - conductingShare) }] });
  script.acting = pulled(0.43);
  script.run('above-elbow', { after: 12 });
  script.acting = pulled(0.4);
  script.run('above-elbow', { after: 14 });
  script.give({ name: 'tell-alert', alertId: 'ulnar-2', whom: 'Surgeon', how: 'voice' }, { after: 9 });
  script.give({ name: 'read-back-alert', alertId: 'ulnar-2', words: 'Ulnar down since I lifted it, I let the loop go' }, { after: 7 });
  script.run('below-elbow');
  script.give({ name: 'act-on-alert', alertId: 'ulnar-2', action: 'Vessel loop let go, nerve laid back, field irrigated warm' });
  const releasedAt = script.atSeconds;
  const backAt = (afterSeconds: number) => pulled(comingBack(0.4, 0.95, script.atSeconds + afterSeconds - releasedAt, 45));
  script.message('desk', `Ulnar alert: ADM from above the elbow at ${script.percent('above-elbow', 'adm')} of baseline after lifting, from below it at ${script.percent('below-elbow', 'adm')}. Loop let go, testing again.`);
  for (const siteId of ['above-elbow', 'axilla', 'above-elbow', 'axilla']) {
    script.acting = backAt(25);
    script.run(siteId, { after: 25 });
  }
  script.give({ name: 'end-alert', alertId: 'ulnar-2', outcome: 'full', cause: 'surgical', text: 'Pulled by the loop, back after it was let go' });
  script.message('physician', `Agree, ADM from the axilla back at ${script.percent('axilla', 'adm')}. Please test after every step that moves the nerve.`);
  script.acting = pulled(0.95);
  script.runs(ulnarSites);
}

/** In its new bed the site above the elbow lies 12 mm nearer to the elbow: the nerve is as long as before. */
function transposition(script: ScenarioScript): void {
  script.part('Nerve transposed');
  script.step('nerve-transposed', 30);
  script.positionsMm['above-elbow'] = 162;
  script.run('above-elbow');
  script.run('below-elbow');
  const positions = ['axilla', 'above-elbow', 'below-elbow', 'wrist'].map((siteId) => ({ siteId, positionMm: script.positionsMm[siteId] ?? 0 }));
  script.give({ name: 'measure-distances', nerveId: 'ulnar', positions, reason: 'Nerve lies in its new bed' }, { after: 15 });
  script.runs(ulnarSites);
  script.run(armControl);
  script.step('sling-sutured', 25);
  script.advice('Test from the axilla once more before the skin is closed.', 'Will do, with the closing runs');
  script.runs(ulnarSites);
}

const { moments } = story();

/** Ulnar nerve at the elbow: cooling, a nerve that is lifted too far, transposition. */
export const ulnar: Scenario = {
  name: 'ulnar',
  summary: 'Ulnar nerve, transposition: the arm cools, the nerve is lifted and recovers, distances are measured again',
  plan,
  identity: { patientLabel: 'Invented patient, adult', recordNumber: 'DEMO-ULNAR' },
  moments,
};
