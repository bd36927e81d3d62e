import { PiniaColada } from '@pinia/colada';
import { createPinia } from 'pinia';
import type { App } from 'vue';

export const pinia = createPinia();

export function installPinia(app: App): void {
  app.use(pinia);
  // Server state is asked for again when a page is entered, never because a window was looked at: an editor's
  // unsaved text must not be replaced under their hands.
  app.use(PiniaColada, { queryOptions: { staleTime: 5_000, refetchOnWindowFocus: false } });
}
