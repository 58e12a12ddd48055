import { reactRouter } from '@react-router/dev/vite';
import tailwindcss from '@tailwindcss/vite';
import { defineConfig } from 'vite';
import { precompress } from './scripts/precompress.ts';

export default defineConfig({
  plugins: [tailwindcss(), reactRouter(), precompress()],
  environments: {
    ssr: { build: { rollupOptions: { input: './server/app.ts' } } },
  },
});
