import tailwindcss from '@tailwindcss/vite';
import react from '@vitejs/plugin-react';
import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vite';

const folder = (path: string): string => fileURLToPath(new URL(path, import.meta.url));

export default defineConfig({
  root: folder('client'),
  publicDir: folder('public'),
  plugins: [react(), tailwindcss()],
  build: { outDir: folder('.build/client'), emptyOutDir: true, assetsInlineLimit: 0, sourcemap: true },
});
