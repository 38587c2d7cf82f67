import { spawn } from 'node:child_process';
import path from 'node:path';
import type { Settings } from '@/server/settings/settings';
import { roleAddresses } from './database/prepare-database';
import { serverEnvironment } from './server-environment';
import { endProgram, findStartedProgram } from './started-program.mjs';

type Service = Readonly<{ root: string; settings: Settings; secret: string; adminUrl: string; stop: AbortSignal }>;

/** `npm run dev`: the same database, the server straight from its sources and started again when one changes. */
export async function serveDevelopment({ root, settings, secret, adminUrl, stop }: Service): Promise<void> {
  const environment = { ...serverEnvironment(settings, secret, roleAddresses({ adminUrl, secret })), NODE_ENV: 'development' };
  const tsx = path.join(root, 'node_modules/tsx/dist/cli.mjs');
  const child = spawn(process.execPath, [tsx, 'watch', '--clear-screen=false', 'server/main.ts'], { cwd: root, env: environment as NodeJS.ProcessEnv, stdio: ['ignore', 'inherit', 'inherit'], detached: true });
  const program = child.pid === undefined ? null : findStartedProgram(child.pid);
  const ended = new Promise<void>((tell) => child.once('close', () => tell()));
  stop.addEventListener('abort', () => program !== null && void endProgram(program), { once: true });
  await ended;
}
