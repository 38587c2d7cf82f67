import { generate, verify } from 'otplib';

const stepS = 30;

/** The time step a moment lies in. */
export const stepAt = (nowMs: number): number => Math.floor(nowMs / 1000 / stepS);

/** The code of a time step, six digits. */
export function codeAt(secret: string, step: number): Promise<string> {
  return generate({ secret, epoch: step * stepS });
}

/**
 * The time step that a code belongs to, or null when it is wrong. One step before and after is taken for clocks that
 * differ; whether the step was used before is the database's question.
 */
export async function stepOfCode(secret: string, code: string, nowMs: number): Promise<number | null> {
  if (!/^\d{6}$/.test(code)) return null;
  const verdict = await verify({ secret, token: code, epoch: Math.floor(nowMs / 1000), epochTolerance: stepS });
  return verdict.valid ? stepAt(nowMs) + verdict.delta : null;
}

/** The code a person may use next, and how long it is taken: a step that was used is skipped. */
export async function nextCode(secret: string, lastUsedStep: number, nowMs: number): Promise<{ code: string; secondsLeft: number }> {
  const now = stepAt(nowMs);
  const step = Math.min(Math.max(now, lastUsedStep + 1), now + 1);
  return { code: await codeAt(secret, step), secondsLeft: Math.ceil((step + 1) * stepS - nowMs / 1000) };
}
