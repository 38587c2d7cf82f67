import { bounds, type BoundedQuantity } from '@/lib/units/bounds';
import { roundTo } from '@/lib/units/round-to';

/** A typed number: read, empty, or a sentence that names the value and what is allowed. */
export type TypedNumber =
  | { readonly kind: 'read'; readonly value: number }
  | { readonly kind: 'empty' }
  | { readonly kind: 'wrong'; readonly sentence: string };

/** How a field shows a quantity that the case keeps in another unit. */
export interface ShownUnit {
  readonly unit: string;
  /** Kept value of one shown unit: 1000 for mV shown and µV kept. */
  readonly factor: number;
}

const finest = 1e-6;

/** Reads what was typed into a field of a bounded quantity. */
export function readNumber(typed: string, quantity: BoundedQuantity, shown: ShownUnit = { unit: bounds[quantity].unit, factor: 1 }): TypedNumber {
  const text = typed.trim().replace(',', '.');
  if (text === '') return { kind: 'empty' };
  const { min, max, reason } = bounds[quantity];
  const allowed = `${min / shown.factor} to ${max / shown.factor} ${shown.unit} is allowed`;
  if (!/^-?(\d+\.?\d*|\.\d+)$/.test(text)) return { kind: 'wrong', sentence: `“${typed.slice(0, 20)}” is no number: ${allowed}` };
  const value = Number(text) * shown.factor;
  if (!(value >= min && value <= max)) return { kind: 'wrong', sentence: `${text} ${shown.unit} is out of range: ${allowed}. ${reason}` };
  // 3.3 mV is 3300 µV, not 3299.9999999999995.
  return { kind: 'read', value: roundTo(value, finest) };
}
