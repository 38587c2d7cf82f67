import type { Priority } from '@/lib/alert/judgement';
import type { Tone } from '@/lib/chart/scene';

const tones: Record<Priority, Tone> = { alert: 'high', notice: 'medium', watch: 'low' };

/**
 * The tone of a priority; without one, the plain tone given.
 * @param priority 'alert', 'notice', 'watch' or null
 * @param plain tone where there is no priority
 * @returns a tone of the scene
 * @source the alarm standard's colours by priority (IEC 60601-1-8, from memory)
 * @accuracy exact
 * @example
 * toneOf('alert', 'ink') // => 'high'
 */
export function toneOf(priority: Priority | null, plain: Tone): Tone {
  return priority === null ? plain : tones[priority];
}
