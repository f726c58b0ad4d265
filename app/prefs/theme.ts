import { createStore } from 'zustand/vanilla';
import type { StoreApi } from 'zustand/vanilla';
import type { Theme } from '../theme/bands';
import type { Prefs } from './prefs';

/** The theme in force, for what CSS cannot colour (the map). */
export const themeStore = createStore<{ theme: Theme }>(() => ({ theme: 'night' }));

/** Sets the theme of the page from the choice and, on `auto`, from the machine. Returns the function that stops. */
export function followTheme(prefs: StoreApi<Prefs>): () => void {
  const light = window.matchMedia('(prefers-color-scheme: light)');
  const apply = (): void => {
    const choice = prefs.getState().theme;
    const theme: Theme = choice === 'auto' ? (light.matches ? 'day' : 'night') : choice;
    document.documentElement.dataset['theme'] = theme;
    themeStore.setState({ theme });
  };
  apply();
  light.addEventListener('change', apply);
  const stop = prefs.subscribe(apply);
  return () => {
    light.removeEventListener('change', apply);
    stop();
  };
}
