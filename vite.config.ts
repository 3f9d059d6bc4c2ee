// How the page is built and served while developing.
import tailwindcss from '@tailwindcss/vite';
import react from '@vitejs/plugin-react';
import { defineConfig } from 'vite';

export default defineConfig({
  plugins: [react(), tailwindcss()],
  server: {
    host: '127.0.0.1',
    // A changed Host would be refused as a foreign origin, so the browser's own is kept.
    proxy: { '/api': { target: `http://127.0.0.1:${process.env.PORT ?? '4310'}`, changeOrigin: false } },
  },
  build: {
    outDir: 'dist/client',
    emptyOutDir: true,
    target: 'es2023',
    // The page's policy allows images from data: addresses but no fonts, so nothing but small drawings may be inlined.
    assetsInlineLimit: (file) => (file.endsWith('.svg') ? undefined : false),
    rolldownOptions: {
      output: {
        codeSplitting: {
          groups: [
            {
              name: 'react',
              test: /node_modules[\\/](react|react-dom|scheduler|react-router|react-router-dom)[\\/]/,
            },
            { name: 'query', test: /node_modules[\\/]@tanstack[\\/]/ },
            { name: 'forms', test: /node_modules[\\/](react-hook-form|@hookform)[\\/]/ },
            { name: 'zod', test: /node_modules[\\/]zod[\\/]/ },
          ],
        },
      },
    },
  },
});
