// What the client tells of the editor's colours: pictures in hovers see no stylesheet. Light and dark are also what
// high contrast comes to.

export const THEME_NOTIFICATION = 'tautline/theme';

export type Theme = 'light' | 'dark';

/** Reads `{ theme }` as sent at the start and on each change; light where nothing is said. */
export function readTheme(sent: unknown): Theme {
  return typeof sent === 'object' && sent !== null && Reflect.get(sent, 'theme') === 'dark' ? 'dark' : 'light';
}
