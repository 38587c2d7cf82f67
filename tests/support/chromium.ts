import { existsSync } from 'node:fs';
import { chromium, type Browser } from 'playwright-core';
import { installFromDebian } from '@/server/setup/install-from-debian';

const program = '/usr/bin/chromium';
const words = ['--no-sandbox', '--disable-gpu', '--disable-quic', '--no-first-run', '--disable-background-networking', '--disable-component-update', '--disable-sync'];

/** Debian's Chromium, installed when it is missing. */
export async function ensureChromium(): Promise<string> {
  if (existsSync(program)) return 'there already';
  await installFromDebian('chromium', 'Chromium');
  return 'installed';
}

/** Starts Chromium without a window; the caller closes it. */
export function launchChromium(options: { words?: readonly string[] } = {}): Promise<Browser> {
  return chromium.launch({ executablePath: program, args: [...words, ...(options.words ?? [])] });
}
