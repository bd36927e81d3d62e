import { fileURLToPath } from 'node:url';
import { quasar, transformAssetUrls } from '@quasar/vite-plugin';
import vue from '@vitejs/plugin-vue';
import { defineConfig } from 'vite';

const folder = (path: string) => fileURLToPath(new URL(path, import.meta.url));

/** Where `npm run dev` finds the API; the launcher sets it. */
const api = process.env.API_URL ?? 'http://127.0.0.1:3000';

export default defineConfig({
  plugins: [
    vue({ template: { transformAssetUrls } }),
    // Its variables are set once in styles/quasar.sass instead of being prepended to every component.
    quasar({ sassVariables: false }),
  ],
  resolve: { alias: { '@shared': folder('./shared'), '@': folder('./src') } },
  build: {
    outDir: 'dist/client',
    manifest: true,
    // The content-security policy allows fonts and pictures from this origin only, no data addresses for scripts or fonts.
    assetsInlineLimit: (file) => (file.endsWith('.svg') ? undefined : false),
    modulePreload: { polyfill: false },
  },
  server: { host: '127.0.0.1', proxy: { '/api': api, '/healthz': api } },
});
