import { decimal } from '@/lib/text/format';
import { velocityDigits } from '@/lib/text/velocity-digits';

/** A velocity with its standard error, as many digits each, without the unit: "59 ±1", "3.5 ±0.1". No error is shown as none. */
export function velocityWithError(velocityMps: number, standardErrorMps: number): string {
  const digits = velocityDigits(velocityMps);
  const step = 10 ** -digits;
  return `${decimal(velocityMps, digits)} ±${decimal(Math.max(step, standardErrorMps), digits)}`;
}
