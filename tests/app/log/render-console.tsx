import { render, type RenderResult } from '@testing-library/react';
import { useState } from 'react';

import { LogContext, type LogCase } from '@/app/_features/log/log-context';
import type { LogDialog } from '@/app/_features/log/log-dialog';
import { LogDialogs } from '@/app/_features/log/log-dialogs';
import { SiteGroup } from '@/app/_features/log/site-group';
import type { PersonCommand } from '@/lib/contracts/http/commands';
import type { CaseBuilder } from '@/tests/support/case-builder';

/** The questions of the console over a case of a script, with what they gave. Each button of `openers` opens one. */
export function renderConsole(script: CaseBuilder, openers: Readonly<Record<string, LogDialog>>): RenderResult & { readonly given: readonly PersonCommand[] } {
  const given: PersonCommand[] = [];
  function Console() {
    const [dialog, setDialog] = useState<LogDialog | null>(null);
    const [siteId, setSiteId] = useState('wrist');
    const head: LogCase['head'] = {
      caseId: 'case-1',
      hospitalId: 'hospital-1',
      hospitalName: 'Larkmoor',
      timeZone: 'UTC',
      reference: 'K7-0001',
      role: 'neurophysiologist',
      mayWrite: true,
      patientLabel: null,
      recordNumber: null,
    };
    const give: LogCase['give'] = async (command) => {
      given.push(command);
      return { kind: 'committed', caseId: 'case-1', entries: [], commandId: null };
    };
    const held: LogCase = { caseId: 'case-1', head, timeZone: 'UTC', state: script.state, entries: script.entries, waitingEntries: [], waiting: [], give, openDialog: setDialog };
    return (
      <LogContext.Provider value={held}>
        <main id="main" tabIndex={-1}>
          <SiteGroup nerves={script.state.plan.nerves} siteId={siteId} onChoose={setSiteId} />
          {Object.entries(openers).map(([name, wanted]) => <button key={name} type="button" onClick={() => setDialog(wanted)}>{name}</button>)}
        </main>
        {dialog === null ? null : <LogDialogs dialog={dialog} onClose={() => setDialog(null)} />}
      </LogContext.Provider>
    );
  }
  return { ...render(<Console />), given };
}
