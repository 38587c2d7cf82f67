/** A short fixed name made of a title: lower-case letters, digits and hyphens; the fallback when nothing is left. */
export function slugOf(title: string, fallback: string): string {
  const plain = title.normalize('NFKD').replace(/\p{Diacritic}/gu, '').toLowerCase();
  const slug = plain.replace(/[^a-z0-9]+/g, '-').slice(0, 34).replace(/^-+|-+$/g, '');
  return slug === '' ? fallback : slug;
}

/** The same name with a number behind it, as long as it is taken. */
export function freeSlug(slug: string, taken: ReadonlySet<string>): string {
  let free = slug;
  for (let count = 2; taken.has(free); count += 1) free = `${slug}-${count}`;
  return free;
}
