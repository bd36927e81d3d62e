import { useLocalStorage } from '@vueuse/core';
import { defineStore } from 'pinia';
import { computed, ref } from 'vue';

export const THEMES = ['paper', 'cellar'] as const;
export type Theme = (typeof THEMES)[number];
export const UNIT_SYSTEMS = ['metric', 'us', 'imperial'] as const;
export type UnitSystem = (typeof UNIT_SYSTEMS)[number];

/** What a reader chose for this device. `public/theme.js` has set the theme before the first paint. */
export const usePreferencesStore = defineStore('preferences', () => {
  const theme = ref<Theme>(document.documentElement.dataset.theme === 'cellar' ? 'cellar' : 'paper');
  const stored = useLocalStorage<string>('units', 'metric');
  const units = computed<UnitSystem>({
    get: () => UNIT_SYSTEMS.find((system) => system === stored.value) ?? 'metric',
    set: (system) => (stored.value = system),
  });

  function switchTheme(): void {
    theme.value = theme.value === 'paper' ? 'cellar' : 'paper';
    document.documentElement.dataset.theme = theme.value;
    try {
      localStorage.setItem('theme', theme.value);
    } catch {
      // Where storage is refused the choice holds until the page is left.
    }
  }

  return { theme, units, switchTheme };
});
