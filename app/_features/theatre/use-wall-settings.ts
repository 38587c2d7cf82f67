'use client';

import { useSyncExternalStore } from 'react';

import { readWallSettings, usualWallSettings, type WallSettings } from '@/app/_features/theatre/wall-settings';

let settings: WallSettings | null = null;

/** The address is read once: a wall has no control that could change it. */
function currentSettings(): WallSettings {
  settings ??= readWallSettings();
  return settings;
}

function never(): () => void {
  return () => undefined;
}

/** How this wall hangs. */
export function useWallSettings(): WallSettings {
  return useSyncExternalStore(never, currentSettings, () => usualWallSettings);
}
