import { fileURLToPath } from 'node:url';
import vue from '@vitejs/plugin-vue';
import { defineConfig } from 'vitest/config';

const folder = (path: string) => fileURLToPath(new URL(path, import.meta.url));
const alias = { '@shared': folder('./shared'), '@': folder('./src') };

export default defineConfig({
  test: {
    maxWorkers: 2,
    projects: [
      { test: { name: 'shared', include: ['tests/shared/**/*.test.ts'] }, resolve: { alias } },
      {
        test: {
          name: 'server',
          include: ['tests/server/**/*.test.ts'],
          globalSetup: ['tests/support/global-setup.ts'],
          testTimeout: 30_000,
          hookTimeout: 60_000,
        },
      },
      {
        plugins: [vue()],
        resolve: {
          alias: [
            // Vitest would take the build for servers.
            { find: /^quasar$/, replacement: 'quasar/dist/quasar.client.js' },
            ...Object.entries(alias).map(([find, replacement]) => ({ find, replacement })),
          ],
        },
        test: {
          name: 'src',
          include: ['tests/src/**/*.test.ts'],
          environment: 'jsdom',
          server: { deps: { inline: ['quasar'] } },
        },
      },
    ],
  },
});
