/** Dark for the theatre, light for paper. */
export type Theme = 'theatre' | 'paper';

/** Where the viewer's choice is remembered: a cookie, so that the first paint already has it. */
export const themeCookie = 'fascicle-theme';

/** The theme a cookie names; anything else is the theatre's. */
export function themeFromCookie(value: string | undefined): Theme {
  return value === 'paper' ? 'paper' : 'theatre';
}
