/** The map: what stands at the top of the house. */
export const topLevel = [
  'app', 'server', 'lib', 'db', 'public', 'tests',
  'package.json', 'package-lock.json', 'next.config.mjs', 'tailwind.config.ts', 'knexfile.ts', 'tsconfig.json',
  'README.md', 'DEVELOPERS.md',
];

/** Problems of the top level: something too much, or something missing. Dotfiles are free. */
export function checkTopLevel(paths: readonly string[]): readonly string[] {
  const present = new Set(paths.map((path) => path.split('/')[0] ?? path));
  const strangers = [...present].filter((name) => !name.startsWith('.') && !topLevel.includes(name));
  const missing = topLevel.filter((name) => !present.has(name));
  return [
    ...strangers.map((name) => `${name}: not on the map of the top level`),
    ...missing.map((name) => `${name}: missing at the top level`),
  ];
}
