'use client';

import { ActionDialog } from '@/app/_features/log/dialogs/action-dialog';
import { BaselineDialog } from '@/app/_features/log/dialogs/baseline-dialog';
import { CloseDialog } from '@/app/_features/log/dialogs/close-dialog';
import { ConditionDialog } from '@/app/_features/log/dialogs/condition-dialog';
import { CorrectDialog } from '@/app/_features/log/dialogs/correct-dialog';
import { DistancesDialog } from '@/app/_features/log/dialogs/distances-dialog';
import { EndDialog } from '@/app/_features/log/dialogs/end-dialog';
import { ExaminationDialog } from '@/app/_features/log/dialogs/examination-dialog';
import { KeysDialog } from '@/app/_features/log/dialogs/keys-dialog';
import { OtherStepDialog } from '@/app/_features/log/dialogs/other-step-dialog';
import { PairDialog } from '@/app/_features/log/dialogs/pair-dialog';
import { PhaseDialog } from '@/app/_features/log/dialogs/phase-dialog';
import { ReadBackDialog } from '@/app/_features/log/dialogs/read-back-dialog';
import { TimeoutDialog } from '@/app/_features/log/dialogs/timeout-dialog';
import { ToldDialog } from '@/app/_features/log/dialogs/told-dialog';
import type { LogDialog } from '@/app/_features/log/log-dialog';

/** The one question that is open. */
export function LogDialogs({ dialog, onClose }: { readonly dialog: LogDialog; readonly onClose: () => void }) {
  switch (dialog.kind) {
    case 'told':
      return <ToldDialog alertId={dialog.alertId} onClose={onClose} />;
    case 'read-back':
      return <ReadBackDialog alertId={dialog.alertId} onClose={onClose} />;
    case 'action':
      return <ActionDialog alertId={dialog.alertId} onClose={onClose} />;
    case 'end':
      return <EndDialog alertId={dialog.alertId} onClose={onClose} />;
    case 'condition':
      return <ConditionDialog first={dialog.condition} onClose={onClose} />;
    case 'distances':
      return <DistancesDialog firstNerveId={dialog.nerveId} onClose={onClose} />;
    case 'correct':
      return <CorrectDialog firstSeq={dialog.runSeq} onClose={onClose} />;
    case 'other-step':
      return <OtherStepDialog onClose={onClose} />;
    case 'timeout':
      return <TimeoutDialog onClose={onClose} />;
    case 'phase':
      return <PhaseDialog onClose={onClose} />;
    case 'baseline':
      return <BaselineDialog onClose={onClose} />;
    case 'pair':
      return <PairDialog onClose={onClose} />;
    case 'close':
      return <CloseDialog onClose={onClose} />;
    case 'examination':
      return <ExaminationDialog onClose={onClose} />;
    case 'keys':
      return <KeysDialog onClose={onClose} />;
  }
}
