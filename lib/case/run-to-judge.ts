import type { RunBody } from '@/lib/case/run-body';

/** A run to judge, with the time of its stimulus. It may be logged already or only previewed. */
export interface RunToJudge {
  readonly at: string;
  readonly run: RunBody;
}
