'use client';

import { useEffect, useState } from 'react';

import { Button } from '@/app/_ui/button';
import { themeCookie, themeFromCookie, type Theme } from '@/app/_ui/theme';

function rememberedTheme(): Theme {
  const pair = document.cookie.split('; ').find((part) => part.startsWith(`${themeCookie}=`));
  return themeFromCookie(pair?.slice(themeCookie.length + 1));
}

/** The viewer's own choice of dark or light, remembered in this browser for a year. */
export function ThemeToggle() {
  const [theme, setTheme] = useState<Theme | null>(null);

  // A page kept for work without a link was painted with an older choice: the cookie is the truth.
  useEffect(() => {
    const remembered = rememberedTheme();
    document.documentElement.dataset.theme = remembered;
    setTheme(remembered);
  }, []);

  const other: Theme = theme === 'paper' ? 'theatre' : 'paper';
  const handleToggle = () => {
    document.cookie = `${themeCookie}=${other}; path=/; max-age=31536000; samesite=lax`;
    document.documentElement.dataset.theme = other;
    setTheme(other);
  };
  return (
    <Button onClick={handleToggle} disabled={theme === null}>
      {other === 'paper' ? 'Light' : 'Dark'}
    </Button>
  );
}
