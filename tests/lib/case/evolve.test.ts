import { describe, expect, it } from 'vitest';

import { applyEntry } from '@/lib/case/apply-entry';
import { evolve } from '@/lib/case/evolve';
import { initialState } from '@/lib/case/initial-state';
import type { CaseState } from '@/lib/case/case-state';
import type { CaseEntry, EntryDraft } from '@/lib/case/entry-bodies';
import { decide } from '@/lib/case/decide';
import { everyKindCase } from '@/tests/lib/case/every-kind';
import { absent, type CaseBuilder } from '@/tests/support/case-builder';
import { adm, fdiAt, monitoredUlnar, ulnarSites } from '@/tests/support/ulnar-case';

/** Plays runs, steps, conditions and alerts straight through decide and evolve, without bytes and hashes, for long cases. */
function playLong(script: CaseBuilder, runCount: number): CaseState {
  let state = script.state;
  let nowMs = script.nowMs;
  const commit = (drafts: readonly EntryDraft[]) => {
    for (const draft of drafts) {
      const at = new Date(nowMs).toISOString();
      state = evolve(state, { ...draft, seq: state.seq + 1, eventAt: at, recordedAt: at, commandId: '', author: { id: '', role: '', displayName: '' } } as CaseEntry);
    }
  };
  for (let count = 0; count < runCount; count += 1) {
    nowMs += 1000;
    const context = { eventAt: new Date(nowMs).toISOString(), nowMs };
    const site = ulnarSites[count % 4]!;
    const share = count % 40 < 20 ? 1 : 0.3;
    const run = script.runBody(site, count % 40 === 25 ? { adm: absent(20), fdi: fdiAt(site) } : { adm: adm(site, share), fdi: fdiAt(site, share) });
    const decisions = [decide(state, { name: 'log-run', run }, context)];
    if (count % 5 === 0) decisions.push(decide(state, { name: 'log-step', stepId: 'nerve-lifted', label: null }, context));
    for (const decision of decisions) if (decision.kind === 'accepted') commit(decision.drafts);
    const open = state.incidents['ulnar'];
    if (open !== undefined && count % 97 === 0) {
      const ended = decide(state, { name: 'end-alert', alertId: open.alertId, outcome: 'none', cause: 'undetermined', text: null }, context);
      if (ended.kind === 'accepted') commit(ended.drafts);
    }
  }
  return state;
}

describe('evolve', () => {
  it('evolve keeps the state bounded: after 5,000 runs it is as large as after 520', () => {
    const script = monitoredUlnar(['adm', 'fdi']);
    const sizes = [520, 5000].map((runCount) => JSON.stringify(playLong(script, runCount)).length);
    // Numbers of entries get one digit longer; nothing else may grow.
    expect(sizes[1]! / sizes[0]!).toBeLessThan(1.01);
    expect(sizes[1]).toBeLessThan(64 * 1024);
  });

  it('evolve never forgets the last risk step, however many steps come after it', () => {
    const script = monitoredUlnar().wait(1000);
    script.step('nerve-lifted');
    for (let count = 0; count < 100; count += 1) script.wait(10).step('incision');
    expect(script.state.steps.length).toBeLessThanOrEqual(40);
    expect(script.view().lead.headline).toBe('Not tested since nerve lifted');
  });

  it('evolve gives a state that JSON carries without loss, at every entry', () => {
    const script = everyKindCase();
    let state = initialState(script.entries[0]!.caseId);
    for (const entry of script.entries) {
      state = applyEntry(JSON.parse(JSON.stringify(state)) as CaseState, entry);
      expect(JSON.parse(JSON.stringify(state))).toEqual(state);
    }
    expect(state).toEqual(script.state);
  });

  it('evolve keeps six runs of each site', () => {
    const script = monitoredUlnar();
    for (let count = 0; count < 10; count += 1) script.wait(1000).run('wrist', { adm: adm('wrist') });
    expect(script.state.runs.filter((kept) => kept.run.siteId === 'wrist').length).toBe(6);
    expect(script.state.runs.filter((kept) => kept.run.siteId === 'axilla').length).toBe(4);
  });
});
