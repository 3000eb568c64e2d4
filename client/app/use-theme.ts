import { useChangePreferences } from '#client/api/me.ts';
import { type Me } from '#server/contracts/people.ts';
import { showTheme, type Theme } from './theme.ts';

/** The theme a person chose: shown at once, kept in this browser, and with the person for other devices. */
export function useTheme(me: Me) {
  const change = useChangePreferences();
  return {
    theme: change.isPending ? (change.variables.theme ?? me.preferences.theme) : me.preferences.theme,
    choose: (theme: Theme) => {
      showTheme(theme);
      change.mutate({ theme });
    },
    failure: change.error,
  };
}
