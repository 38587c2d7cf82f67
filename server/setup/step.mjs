/**
 * Runs one step of the setting up and prints its name and how long it took. The work may return a remark to print.
 * @param {string} name
 * @param {() => Promise<string | void> | string | void} work
 */
export async function step(name, work) {
  const begin = performance.now();
  process.stdout.write(`  ${name.padEnd(12)} … `);
  try {
    const remark = await work();
    process.stdout.write(`${duration(performance.now() - begin)}${remark ? `  ${remark}` : ''}\n`);
  } catch (error) {
    process.stdout.write(`failed after ${duration(performance.now() - begin)}\n`);
    throw error;
  }
}

/**
 * @param {number} elapsedMs
 * @returns {string}
 */
export function duration(elapsedMs) {
  if (elapsedMs < 9_950) return `${(elapsedMs / 1000).toFixed(1)} s`;
  if (elapsedMs < 119_500) return `${Math.round(elapsedMs / 1000)} s`;
  return `${(elapsedMs / 60_000).toFixed(1)} min`;
}
