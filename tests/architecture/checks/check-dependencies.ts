import type { HouseFile } from '@/tests/architecture/checks/repository-files';

/** Packages whose version is a range: another install would be another program. */
export function checkPinned(versions: Readonly<Record<string, string>>): readonly string[] {
  return Object.entries(versions)
    .filter(([, version]) => !/^\d+\.\d+\.\d+(-[\w.]+)?$/.test(version))
    .map(([name, version]) => `${name}: ${version} is not one version`);
}

/** Packages that the compiler or a tool reads by itself, with who does. */
const usedByItself: Readonly<Record<string, RegExp>> = {
  '@types/node': /from 'node:|import 'node:|--import tsx/,
  '@types/react': /from 'react'/,
  '@types/react-dom': /from 'react(-dom)?'/,
  '@types/pg': /from 'pg'/,
  'react-dom': /from 'next[/']/,
  vite: /from 'vitest[/']/,
  jsdom: /environment:? '?jsdom/,
  // Its peer: it brings the queries.
  '@testing-library/dom': /from '@testing-library\/react'/,
};

/** Packages that nothing imports, starts or reads. */
export function checkUsed(names: readonly string[], files: readonly HouseFile[]): readonly string[] {
  const isProse = (file: HouseFile) => file.path.endsWith('.md') || file.path.startsWith('tests/architecture/');
  const ownTools = files.filter((file) => /^tests\/architecture\/(eslint\.config\.mjs|.*\.test\.ts|checks\/.*)$/.test(file.path));
  const texts = [...files.filter((file) => !isProse(file)), ...ownTools].map((file) =>
    file.path === 'package.json' ? usesInManifest(file.text) : file.text,
  );
  return names.filter((name) => !texts.some((text) => isUsedIn(name, text))).map((name) => `${name}: named in package.json and never used`);
}

/** What package.json itself uses: its scripts and the settings of tools, not the lists of packages. */
function usesInManifest(text: string): string {
  const { scripts, postcss } = JSON.parse(text) as { scripts?: Readonly<Record<string, string>>; postcss?: unknown };
  return `${Object.values(scripts ?? {}).map((line) => `$ ${line}`).join('\n')}\n${JSON.stringify(postcss ?? {})}`;
}

function isUsedIn(name: string, text: string): boolean {
  const byItself = usedByItself[name];
  if (byItself) return byItself.test(text);
  const escaped = name.replace(/[/.]/g, '\\$&');
  const asText = new RegExp(`(from|import|import\\(|require\\(|resolve\\(|@import|@plugin|url\\()\\s*['"(]?${escaped}(/[^'"]*)?['")]`);
  const asFile = new RegExp(`node_modules['"/, ]+${escaped}(/|'|")`);
  const asSetting = new RegExp(`"${escaped}":\\s*\\{`);
  const asCommand = new RegExp(`(^\\$ (.* )?|&& |--import[ '",]+|npx |bin/)${escaped}([ '"]|$)`, 'm');
  return asText.test(text) || asFile.test(text) || asSetting.test(text) || asCommand.test(text);
}

/** Problems of the lock: an address of one machine's host, or a package that nothing proves. */
export function checkLock(text: string): readonly string[] {
  const { packages } = JSON.parse(text) as { packages: Readonly<Record<string, { resolved?: string; integrity?: string; link?: boolean; inBundle?: boolean }>> };
  return Object.entries(packages).flatMap(([path, entry]) => {
    if (entry.resolved !== undefined) return [`${path}: the lock names ${entry.resolved}`];
    const isProved = path === '' || entry.integrity !== undefined || entry.link === true || entry.inBundle === true;
    return isProved ? [] : [`${path}: no integrity, nothing proves what is installed`];
  });
}

/** Packages that DEVELOPERS.md does not name on a line with at least three words of reason. */
export function checkReasons(names: readonly string[], page: string): readonly string[] {
  return names
    .filter((name) => {
      const whole = new RegExp(`(^|[\`\\s|,(])${name.replace(/[/.]/g, '\\$&')}($|[\`\\s|,:)])`);
      return !page.split('\n').some((line) => whole.test(line) && line.split(/\s+/).filter((word) => /[a-z]{2,}/i.test(word)).length >= 4);
    })
    .map((name) => `${name}: DEVELOPERS.md gives no reason for it`);
}
