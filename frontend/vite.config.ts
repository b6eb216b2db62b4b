import react from '@vitejs/plugin-react';
import { defineConfig } from 'vite';

const target = process.env.API_URL;

export default defineConfig({
  plugins: [react()],
  // The first condition makes @holdwater/shared-types resolve to its sources.
  resolve: { conditions: ['holdwater-source', 'module', 'browser', 'development|production'] },
  server: {
    host: '127.0.0.1',
    proxy: target
      ? { '/api': { target, changeOrigin: true }, '/socket.io': { target, changeOrigin: true, ws: true } }
      : undefined,
  },
  build: {
    outDir: 'dist',
    // The page's policy has no data: for fonts, so nothing is inlined.
    assetsInlineLimit: 0,
    // Preloading needs no inline script with modern browsers.
    modulePreload: { polyfill: false },
    sourcemap: true,
  },
});
