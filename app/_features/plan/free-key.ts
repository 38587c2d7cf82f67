/** A key for a new row that no other row has. */
export function freeKey(noun: string, taken: readonly string[]): string {
  let count = taken.length + 1;
  while (taken.includes(`new-${noun}-${count}`)) count += 1;
  return `new-${noun}-${count}`;
}
