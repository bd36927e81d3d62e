import type { App } from 'vue';
import { router } from '@/router/index.ts';

export function installRouter(app: App): void {
  app.use(router);
}
