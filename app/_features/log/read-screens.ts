import { ask } from '@/app/_live/api';

/** One wall that is or was bound to the case. */
export interface ScreenLine {
  readonly screenId: string;
  readonly pairedAt: string;
  readonly endedAt: string | null;
  readonly isConnected: boolean;
}

function isScreen(value: unknown): value is ScreenLine {
  if (typeof value !== 'object' || value === null) return false;
  const row = value as Record<string, unknown>;
  const isEnd = row['endedAt'] === null || typeof row['endedAt'] === 'string';
  return typeof row['screenId'] === 'string' && typeof row['pairedAt'] === 'string' && typeof row['isConnected'] === 'boolean' && isEnd;
}

const contract = {
  safeParse: (value: unknown) => {
    const screens: unknown = typeof value === 'object' && value !== null && 'screens' in value ? value.screens : null;
    return Array.isArray(screens) && screens.every(isScreen) ? ({ success: true, data: screens } as const) : ({ success: false } as const);
  },
};

/** The walls of a case. */
export const readScreens = (caseId: string): Promise<readonly ScreenLine[]> => ask<readonly ScreenLine[]>(`/api/cases/${caseId}/screens`, contract);

/** Ends a wall at once. */
export const revokeScreen = (caseId: string, screenId: string): Promise<readonly ScreenLine[]> =>
  ask<readonly ScreenLine[]>(`/api/cases/${caseId}/screens/${screenId}`, contract, { method: 'DELETE' });
