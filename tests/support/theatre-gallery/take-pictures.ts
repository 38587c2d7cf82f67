/*
 * Pictures of every state of the theatre screen, for the eye: node --import tsx tests/support/theatre-gallery/take-pictures.ts [state…]
 * They go to tests/.out/theatre. The page runs under the product's style policy, so that a style attribute shows here first.
 */
import { mkdir, readFile } from 'node:fs/promises';
import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import path from 'node:path';

import tailwind from '@tailwindcss/postcss';
import { build } from 'esbuild';
import postcss from 'postcss';
import { chromium } from 'playwright-core';

import { wallStates } from '@/tests/support/theatre-gallery/wall-states';

const root = path.resolve(import.meta.dirname, '../../..');
const allSizes = [[1440, 900], [1920, 1080], [3840, 2160], [1080, 1920]] as const;
const only = process.argv.find((word) => word.startsWith('--width='))?.slice('--width='.length);
const sizes = allSizes.filter(([width]) => only === undefined || only.split(',').includes(String(width)));
const themes = (process.argv.find((word) => word.startsWith('--theme='))?.slice('--theme='.length) ?? 'theatre,paper').split(',');
const wanted = process.argv.slice(2).filter((word) => !word.startsWith('--'));
const query = process.argv.find((word) => word.startsWith('--query='))?.slice('--query='.length) ?? '';
const states = wanted.length > 0 ? wanted : [...Object.keys(wallStates), 'not-paired', 'ended', 'not-live-alert', 'not-live-stable'];

const bundle = await build({
  entryPoints: [path.join(import.meta.dirname, 'gallery-page.tsx')],
  bundle: true, write: false, format: 'iife', jsx: 'automatic', define: { 'process.env.NODE_ENV': '"production"' },
});
const faces = ['next', 'mono'].map((face) =>
  `@font-face{font-family:${face === 'next' ? 'Hyper' : 'HyperMono'};font-weight:200 800;src:url(/${face}.woff2)}`).join('') +
  ':root{--font-hyper:Hyper;--font-hyper-ext:Hyper;--font-hyper-mono:HyperMono;--font-hyper-mono-ext:HyperMono}body{font-family:Hyper}';
const sheet = path.join(root, 'app/globals.css');
const styles = await postcss([tailwind()]).process(await readFile(sheet, 'utf8'), { from: sheet });
const page = '<!doctype html><html lang="en-GB"><meta charset="utf-8"><title>Theatre</title><link rel="stylesheet" href="/page.css"><body><div id="root"></div><script src="/page.js"></script></body></html>';

const server = createServer((request, response) => {
  const name = (request.url ?? '/').split('?')[0];
  response.setHeader('content-security-policy', "default-src 'self'; style-src 'self'; script-src 'self'");
  if (name === '/page.js') response.setHeader('content-type', 'text/javascript').end(bundle.outputFiles[0]?.text);
  else if (name === '/page.css') response.setHeader('content-type', 'text/css').end(faces + styles.css);
  else if (name?.endsWith('.woff2')) {
    const face = name.slice(1, -'.woff2'.length);
    void readFile(path.join(root, `node_modules/@fontsource-variable/atkinson-hyperlegible-${face}/files/atkinson-hyperlegible-${face}-latin-wght-normal.woff2`)).then((font) => response.end(font));
  } else response.setHeader('content-type', 'text/html').end(page);
});
await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
const { port } = server.address() as AddressInfo;

const folder = path.join(root, 'tests/.out/theatre');
await mkdir(folder, { recursive: true });
const browser = await chromium.launch({ executablePath: '/usr/bin/chromium', args: ['--no-sandbox', '--disable-gpu'] });
for (const theme of themes) {
  for (const [width, height] of sizes) {
    const tab = await browser.newPage({ viewport: { width, height }, reducedMotion: 'reduce' });
    tab.on('console', (message) => process.stdout.write(`${message.type()}: ${message.text()}\n`));
    for (const state of states) {
      await tab.goto(`http://127.0.0.1:${port}/?state=${state}&theme=${theme}&${query}`);
      await tab.evaluate(() => document.fonts.ready);
      await tab.waitForTimeout(60);
      const cut = await tab.evaluate(() => {
        const wall = document.querySelector('.wall');
        return wall === null ? 'no wall' : `${wall.scrollWidth - wall.clientWidth},${wall.scrollHeight - wall.clientHeight}`;
      });
      const neededPx = await tab.evaluate(() => document.querySelector<HTMLElement>('.wall')?.style.getPropertyValue('--needed') ?? '');
      const parts = await tab.evaluate(() => [...(document.querySelector('.wall')?.children ?? [])].map((child) => Math.round(child.getBoundingClientRect().height)).join(' '));
      process.stdout.write(`${state} ${theme} ${width}: needed ${neededPx}, heights ${parts}\n`);
      if (cut !== '0,0') process.stdout.write(`${state} ${theme} ${width}: cut by ${cut}\n`);
      await tab.screenshot({ path: path.join(folder, `${state}-${theme}-${width}${query === '' ? '' : `-${query.replaceAll(/\W/g, '-')}`}.png`) });
    }
    await tab.close();
  }
}
await browser.close();
server.close();
