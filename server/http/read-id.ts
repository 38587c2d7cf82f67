import { notFound } from '@/server/failure';
import { uuid } from '@/lib/contracts/text-schemas';

/** An id from an address. What is no id is no case: the same answer as for one that is not there. */
export function readId(text: string): string {
  if (!uuid.safeParse(text).success) throw notFound();
  return text;
}
