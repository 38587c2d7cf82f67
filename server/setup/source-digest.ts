import { createHash } from 'node:crypto';
import { existsSync, readdirSync, readFileSync, statSync } from 'node:fs';
import path from 'node:path';

/** Everything the built product is made of. */
const sources = ['app', 'lib', 'server', 'public', 'db', 'package-lock.json', 'package.json', 'next.config.mjs', 'tailwind.config.ts', 'tsconfig.json'];

/** One digest over the names and bytes of all sources, so that a build is repeated exactly when one of them changed. */
export function sourceDigest(root: string): string {
  const digest = createHash('sha256').update(process.version);
  for (const file of sources.flatMap((source) => filesUnder(root, source))) {
    digest.update(`\0${file}\0`).update(readFileSync(path.join(root, file)));
  }
  return digest.digest('hex');
}

function filesUnder(root: string, name: string): string[] {
  const full = path.join(root, name);
  if (!existsSync(full)) return [];
  if (!statSync(full).isDirectory()) return [name];
  return readdirSync(full).sort().flatMap((entry) => filesUnder(root, `${name}/${entry}`));
}
