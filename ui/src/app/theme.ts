import { useEffect } from 'react';
import { usePreferences, type Preferences, type Theme } from '../lib/preferences';

const darkWish = '(prefers-color-scheme: dark)';

/** Classes on the root for a theme: Blueprint reads `bp6-dark`, our tokens read all three. */
export function themeClasses(
  { theme, noColour }: Pick<Preferences, 'theme' | 'noColour'>,
  wantsDark: boolean,
): string[] {
  const byTheme: Record<Theme, string[]> = {
    system: wantsDark ? ['bp6-dark'] : [],
    light: [],
    dark: ['bp6-dark'],
    daylight: ['daylight'],
  };
  return [...byTheme[theme], ...(noColour ? ['no-colour'] : [])];
}

/** Keeps the root's classes true to the preferences and to the system's wish. */
export function useThemeClasses(): void {
  const { theme, noColour } = usePreferences();
  useEffect(() => {
    const wish = window.matchMedia(darkWish);
    const apply = (): void => {
      const root = document.documentElement;
      root.classList.remove('bp6-dark', 'daylight', 'no-colour');
      root.classList.add(...themeClasses({ theme, noColour }, wish.matches));
    };
    apply();
    wish.addEventListener('change', apply);
    return () => wish.removeEventListener('change', apply);
  }, [theme, noColour]);
}
