import { useLogCase } from '@/app/_features/log/log-context';
import type { RunFormParts } from '@/app/_features/log/use-run-form';
import { Button } from '@/app/_ui/button';
import { Field } from '@/app/_ui/field';

interface RunActionsProps {
  readonly form: RunFormParts;
  readonly onNoResponse: () => void;
  readonly onCorrect: () => void;
}

/** What can be done with the next run, each with its key, and the note that goes with it. */
export function RunActions({ form, onNoResponse, onCorrect }: RunActionsProps) {
  const { state } = useLogCase();
  const { draft } = form;
  return (
    <div className="flex flex-wrap items-center gap-3">
      <Button type="submit" variant="primary" hotkey="Enter">Log run</Button>
      <Button hotkey="N" onClick={onNoResponse}>No response</Button>
      <Button hotkey="R" onClick={form.sameSettings}>Same settings</Button>
      <Button hotkey="U" onClick={onCorrect} disabled={state.runs.length === 0}>Correct last run</Button>
      <Field label="Note" isLabelHidden placeholder="Note" value={draft.note} maxLength={300} autoComplete="off" className="min-w-40 flex-1" onChange={(event) => form.change({ ...draft, note: event.currentTarget.value })} />
      {form.hint === null ? null : <p role="status" className="border-l-4 border-ink pl-3 font-semibold">{form.hint}</p>}
    </div>
  );
}
