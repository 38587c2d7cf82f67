'use client';

import { useEffect, useSyncExternalStore } from 'react';

import { Button } from '@/app/_ui/button';
import { themeCookie, themeFromCookie, type Theme } from '@/app/_ui/theme';

const changed = 'fascicle-theme-changed';

function rememberedTheme(): Theme {
  const pair = document.cookie.split('; ').find((part) => part.startsWith(`${themeCookie}=`));
  return themeFromCookie(pair?.slice(themeCookie.length + 1));
}

function onThemeChange(listener: () => void): () => void {
  window.addEventListener(changed, listener);
  return () => window.removeEventListener(changed, listener);
}

/** The viewer's own choice of dark or light, remembered in this browser for a year. */
export function ThemeToggle() {
  const theme = useSyncExternalStore<Theme | null>(onThemeChange, rememberedTheme, () => null);

  // A page kept for work without a link was painted with an older choice: the cookie is the truth.
  useEffect(() => {
    if (theme !== null) document.documentElement.dataset.theme = theme;
  }, [theme]);

  const other: Theme = theme === 'paper' ? 'theatre' : 'paper';
  const handleToggle = () => {
    document.cookie = `${themeCookie}=${other}; path=/; max-age=31536000; samesite=lax`;
    window.dispatchEvent(new Event(changed));
  };
  return (
    <Button onClick={handleToggle} disabled={theme === null}>
      {other === 'paper' ? 'Light' : 'Dark'}
    </Button>
  );
}
