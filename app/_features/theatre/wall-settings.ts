import type { Theme } from '@/app/_ui/theme';

/** How this wall hangs, as its address says: `?distance=3&diagonal=55&theme=paper`. */
export interface WallSettings {
  readonly distanceM: number;
  readonly diagonalInch: number;
  readonly theme: Theme;
}

const storageKey = 'fascicle-wall';

/** A 55-inch display at 3 m in the dark theme. */
export const usualWallSettings: WallSettings = { distanceM: 3, diagonalInch: 55, theme: 'theatre' };

/** The settings of the address; what it leaves out is as last time, else as usual. Values out of range are left out too. */
export function wallSettings(search: string, remembered: string | null): WallSettings {
  const address = new URLSearchParams(search);
  const before = new URLSearchParams(remembered ?? '');
  const number = (name: string, least: number, most: number, usual: number) =>
    [address, before].map((source) => Number.parseFloat(source.get(name) ?? '')).find((value) => value >= least && value <= most) ?? usual;
  const theme = [address, before].map((source) => source.get('theme')).find((value) => value === 'paper' || value === 'theatre');
  return {
    distanceM: number('distance', 0.5, 10, usualWallSettings.distanceM),
    diagonalInch: number('diagonal', 5, 120, usualWallSettings.diagonalInch),
    theme: theme === 'paper' ? 'paper' : 'theatre',
  };
}

/** Reads the settings in the browser and keeps them for the next start of this wall. */
export function readWallSettings(): WallSettings {
  let remembered: string | null = null;
  try {
    remembered = window.localStorage.getItem(storageKey);
    const settings = wallSettings(window.location.search, remembered);
    window.localStorage.setItem(storageKey, `distance=${settings.distanceM}&diagonal=${settings.diagonalInch}&theme=${settings.theme}`);
    return settings;
  } catch {
    // A wall without storage still shows; it only forgets.
    return wallSettings(window.location.search, remembered);
  }
}
