import tailwindcss from '@tailwindcss/vite';
import react from '@vitejs/plugin-react';
import { defineConfig } from 'vite';

export default defineConfig({
  root: 'client',
  publicDir: '../public',
  plugins: [react(), tailwindcss()],
  build: { outDir: '../.build/client', emptyOutDir: true, assetsInlineLimit: 0, sourcemap: true },
});
