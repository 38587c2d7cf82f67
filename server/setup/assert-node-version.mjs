import { SetupFailure } from './setup-failure.mjs';

/** The first version that can read a file of settings by itself. */
const lowest = [20, 12];

/** @param {string} version */
export function assertNodeVersion(version) {
  const [major = 0, minor = 0] = version.split('.').map(Number);
  if (major > lowest[0] || (major === lowest[0] && minor >= lowest[1])) return;
  throw new SetupFailure('nodeVersion', `This is Node.js ${version}; Fascicle needs ${lowest.join('.')} or later.`);
}
