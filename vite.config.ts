import { reactRouter } from '@react-router/dev/vite';
import tailwindcss from '@tailwindcss/vite';
import { defineConfig } from 'vite';
import { precompress } from './scripts/precompress.ts';

export default defineConfig({
  plugins: [tailwindcss(), reactRouter(), precompress()],
  // The pages' security policy takes fonts and drawings from our own address only, not as data.
  build: { assetsInlineLimit: 0 },
  environments: {
    ssr: { build: { rollupOptions: { input: './server/app.ts' } } },
  },
});
