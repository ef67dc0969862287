import { storedChoice } from './stored-choice.ts';

export const themes = ['system', 'light', 'dark'] as const;
export type Theme = (typeof themes)[number];

/** Same key as public/theme.js, which applies the stored choice before the first paint. */
const choice = storedChoice<Theme>('tiltwright.theme', (stored) => themes.find((theme) => theme === stored) ?? 'system');

export const useTheme = choice.use;

export function setTheme(theme: Theme): void {
  choice.set(theme);
  if (theme === 'system') delete document.documentElement.dataset.theme;
  else document.documentElement.dataset.theme = theme;
}
