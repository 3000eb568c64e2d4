import { type Preferences } from '#server/contracts/people.ts';

export type Theme = Preferences['theme'];

/** The themes to choose from, as the account page and the person's menu name them. */
export const THEMES: readonly { readonly value: Theme; readonly label: string }[] = [
  { value: 'system', label: 'System' },
  { value: 'day', label: 'Day' },
  { value: 'night', label: 'Night' },
];

/** Read by public/theme.js before the first paint. */
const STORAGE_KEY = 'ribwright.theme';
const darkSystem = () => matchMedia('(prefers-color-scheme: dark)');

/** The choice kept in this browser; `system` when there is none or storage is forbidden. */
function keptTheme(): Theme {
  try {
    const kept = localStorage.getItem(STORAGE_KEY);
    return kept === 'day' || kept === 'night' ? kept : 'system';
  } catch {
    return 'system';
  }
}

/** Shows a theme at once and keeps the choice in this browser. */
export function showTheme(theme: Theme): void {
  try {
    if (theme === 'system') localStorage.removeItem(STORAGE_KEY);
    else localStorage.setItem(STORAGE_KEY, theme);
  } catch {
    // Without storage the theme holds until the page is left.
  }
  const night = theme === 'night' || (theme === 'system' && darkSystem().matches);
  document.documentElement.dataset['theme'] = night ? 'night' : 'day';
}

/** Follows the system when it changes between day and night while the page is open. */
export function followSystemTheme(): void {
  darkSystem().addEventListener('change', () => {
    if (keptTheme() === 'system') showTheme('system');
  });
}
