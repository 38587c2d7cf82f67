import type { RowTone } from '@/app/_features/log/log-row-model';
import { Toned } from '@/app/_features/log/toned';
import { velocityWithError } from '@/app/_features/log/velocity-with-error';
import type { Finding, PathJudgement, SegmentJudgement } from '@/lib/alert/judgement';
import { percent, signed } from '@/lib/text/format';
import { notComparedWords } from '@/lib/text/reason-words';

/** What the judge would say of one channel of the run in the form. */
export interface ChannelPreview {
  readonly path: PathJudgement;
  readonly segment: SegmentJudgement | null;
}

/** The run in the form against its baseline, before it is logged: the same judge as the log's. */
export function AgainstBaseline({ preview }: { readonly preview: ChannelPreview | null }) {
  if (preview === null || (preview.path.kind === 'not-compared' && preview.path.reason === 'not-read')) return <span />;
  const { path, segment } = preview;
  return (
    <span className="flex min-h-9 flex-wrap items-center gap-x-3 font-mono">
      {path.kind === 'compared' ? <ChangeWords path={path} /> : <span className="font-sans text-sm text-second">{`Not compared, ${notComparedWords[path.reason]}`}</span>}
      {segment?.velocity.kind === 'velocity' ? (
        <span className={segment.velocity.isImplausible ? 'font-bold' : 'text-second'}>
          {`${velocityWithError(segment.velocity.velocityMps, segment.velocity.standardErrorMps).replace(' ', '\u00a0')}\u00a0m/s`}
        </span>
      ) : null}
    </span>
  );
}

function ChangeWords({ path }: { readonly path: PathJudgement & { kind: 'compared' } }) {
  const { onsetChangeMs, percentOfBaseline } = path.change;
  const isNotice = path.findings.some((finding) => finding.priority === 'notice');
  const said = isNotice ? ', past a limit' : '';
  return (
    <>
      {onsetChangeMs === null ? null : <span><Toned tone={toneOf(path.findings, ['onset-late', 'amplitude-and-onset'])}>{`${signed(onsetChangeMs, 2)}\u00a0ms`}</Toned></span>}
      {percentOfBaseline === null ? null : (
        <span><Toned tone={toneOf(path.findings, ['amplitude-fall', 'amplitude-and-onset', 'response-lost', 'amplitude-watch'])}>{percent(percentOfBaseline)}</Toned></span>
      )}
      {said === '' ? null : <span className="font-sans text-sm font-semibold">{said.slice(2)}</span>}
    </>
  );
}

function toneOf(findings: readonly Finding[], kinds: readonly Finding['kind'][]): RowTone {
  const found = findings.filter((finding) => kinds.includes(finding.kind));
  if (found.some((finding) => finding.priority === 'notice')) return 'medium';
  return found.length > 0 ? 'low' : 'plain';
}
