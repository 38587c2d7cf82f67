import { durationWords } from '@/lib/text/format';

/** The mark of an entry that came long after its time; nothing for the others. */
export function LateWords({ lateMs }: { readonly lateMs: number | null }) {
  return lateMs === null ? null : <span className="ml-2 text-sm text-second">{`received ${durationWords(lateMs)} later`}</span>;
}
