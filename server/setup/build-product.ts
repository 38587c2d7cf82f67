import path from 'node:path';
import { buildFolders } from './build-folders';
import { buildWhenChanged } from './build-when-changed';
import { reportFailure } from './setup-failure.mjs';
import { step } from './step.mjs';

const root = path.resolve(import.meta.dirname, '../..');

try {
  await step('build', () => buildWhenChanged(root, buildFolders(root)));
} catch (error) {
  process.exitCode = reportFailure(error);
}
