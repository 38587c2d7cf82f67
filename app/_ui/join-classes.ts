/** Class names in order, the empty ones left out. */
export function joinClasses(...names: readonly (string | false | null | undefined)[]): string {
  return names.filter((name) => typeof name === 'string' && name !== '').join(' ');
}
