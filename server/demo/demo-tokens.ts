import { execFile } from 'node:child_process';

import type { Credentials } from '@/server/demo/case-client';
import { SetupFailure } from '@/server/setup/setup-failure.mjs';

/** A token as `npm run token` printed it: its number ends it again. */
interface PrintedToken {
  readonly id: string;
  readonly token: string;
}

/** Tokens for the time of one demo, made and ended by the command that a person would type. */
export class DemoTokens {
  private readonly printed: PrintedToken[] = [];

  constructor(private readonly root: string) {}

  /** The headers of a new token for this person, good for a day at most. */
  async credentialsFor(email: string): Promise<Credentials> {
    const { stdout, stderr } = await this.runToken(['--for', email, '--days', '1', '--label', 'Demo']);
    const token = stdout.trim();
    const id = /^Token (\S+) of /m.exec(stderr)?.[1] ?? '';
    if (token === '' || id === '') throw new SetupFailure('unexpected', `"npm run token -- --for ${email}" printed no token.`);
    this.printed.push({ id, token });
    return { authorization: `Bearer ${token}` };
  }

  /** Ends every token of this demo. */
  async revoke(): Promise<void> {
    await Promise.all(this.printed.splice(0).map(({ id }) => this.runToken(['--revoke', id])));
  }

  private runToken(words: readonly string[]): Promise<{ stdout: string; stderr: string }> {
    return new Promise((resolve, reject) => {
      execFile(process.execPath, ['--import', 'tsx', 'server/auth/print-token.ts', ...words], { cwd: this.root }, (error, stdout, stderr) => {
        if (error === null) resolve({ stdout, stderr });
        else reject(new SetupFailure('wrongSetting', stderr.trim() === '' ? `"npm run token" failed: ${error.message}` : stderr.trim()));
      });
    });
  }
}
