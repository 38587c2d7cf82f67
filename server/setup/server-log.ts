import { createWriteStream, existsSync, renameSync, statSync, type WriteStream } from 'node:fs';
import { createInterface } from 'node:readline';
import type { Readable } from 'node:stream';

const largestBytes = 20_000_000;
const warnLevel = 40;

export type ServerLog = Readonly<{ follow: (output: Readable, isErrorOutput: boolean) => void }>;

/** Keeps what the server says in a file of bounded size and repeats warnings and worse at the terminal. */
export function openServerLog(file: string, terminal: (line: string) => void): ServerLog {
  let bytes = existsSync(file) ? statSync(file).size : 0;
  let stream = append(file);
  const write = (line: string) => {
    if (bytes > largestBytes) {
      stream.end();
      renameSync(file, `${file}.1`);
      stream = append(file);
      bytes = 0;
    }
    bytes += Buffer.byteLength(line) + 1;
    stream.write(`${line}\n`);
  };
  return {
    follow: (output, isErrorOutput) => {
      createInterface({ input: output }).on('line', (line) => {
        write(line);
        if (isWorthSaying(line, isErrorOutput)) terminal(line);
      });
    },
  };
}

function append(file: string): WriteStream {
  return createWriteStream(file, { flags: 'a', mode: 0o600 });
}

/** Error output that is not one of the logger's lines comes from outside it (a crash, a library) and is shown. */
function isWorthSaying(line: string, isErrorOutput: boolean): boolean {
  const level = /^\{"level":(\d+),/.exec(line)?.[1];
  return level === undefined ? isErrorOutput && line.trim() !== '' : Number(level) >= warnLevel;
}
