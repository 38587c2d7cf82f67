import { usePrintWhole } from '@/app/_features/record/use-print-whole';
import { useElementWidth } from '@/app/_ui/use-element-width';

/** Width between the margins of an A4 page and the size of its root letter, as record.css sets them; px at 96 to the inch. */
const paper = { widthPx: 690, remPx: 11.5 } as const;

/** The width a picture is drawn at: the page's, or the paper's while it is printed, so that its letters keep their size. */
export function useDrawnWidth(): ReturnType<typeof useElementWidth> {
  const measured = useElementWidth();
  const isPrinting = usePrintWhole();
  return isPrinting ? { ...measured, ...paper } : measured;
}
