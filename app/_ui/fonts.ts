import localFont from 'next/font/local';

// Shipped from the packages, so that no page waits for, or tells, anybody else.
const hyper = localFont({
  src: '../../node_modules/@fontsource-variable/atkinson-hyperlegible-next/files/atkinson-hyperlegible-next-latin-wght-normal.woff2',
  weight: '200 800',
  variable: '--font-hyper',
  display: 'swap',
});

const hyperMono = localFont({
  src: '../../node_modules/@fontsource-variable/atkinson-hyperlegible-mono/files/atkinson-hyperlegible-mono-latin-wght-normal.woff2',
  weight: '200 800',
  variable: '--font-hyper-mono',
  display: 'swap',
});

// Letters beyond western Europe, for names of hospitals and roles; fetched only when one is shown.
const hyperExt = localFont({
  src: '../../node_modules/@fontsource-variable/atkinson-hyperlegible-next/files/atkinson-hyperlegible-next-latin-ext-wght-normal.woff2',
  weight: '200 800',
  variable: '--font-hyper-ext',
  display: 'swap',
  preload: false,
  adjustFontFallback: false,
  declarations: [{ prop: 'unicode-range', value: 'U+0100-02BA,U+02BD-02C5,U+02C7-02CC,U+02CE-02D7,U+02DD-02FF,U+1E00-1E9F,U+1EF2-1EFF' }],
});

const hyperMonoExt = localFont({
  src: '../../node_modules/@fontsource-variable/atkinson-hyperlegible-mono/files/atkinson-hyperlegible-mono-latin-ext-wght-normal.woff2',
  weight: '200 800',
  variable: '--font-hyper-mono-ext',
  display: 'swap',
  preload: false,
  adjustFontFallback: false,
  declarations: [{ prop: 'unicode-range', value: 'U+0100-02BA,U+02BD-02C5,U+02C7-02CC,U+02CE-02D7,U+02DD-02FF,U+1E00-1E9F,U+1EF2-1EFF' }],
});

/** The class names that define the font variables of globals.css; they go on `<html>`. */
export const fontClassNames = [hyper, hyperMono, hyperExt, hyperMonoExt].map((font) => font.variable).join(' ');
