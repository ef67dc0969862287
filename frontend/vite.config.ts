import { fileURLToPath } from 'node:url';
import tailwindcss from '@tailwindcss/vite';
import react from '@vitejs/plugin-react';
import type { Plugin } from 'vite';
import { defineConfig } from 'vitest/config';

/** Where the API listens while the screens are served by vite. */
const apiOrigin = process.env.API_ORIGIN ?? 'http://127.0.0.1:4310';

/** The one font file is needed for the first line of text, so the page asks for it before the style sheet is read. */
function preloadFont(): Plugin {
  return {
    name: 'preload-font',
    transformIndexHtml: {
      order: 'post',
      handler(_html, { bundle }) {
        const fonts = Object.keys(bundle ?? {}).filter((file) => file.endsWith('.woff2'));
        return fonts.map((file) => ({
          tag: 'link',
          injectTo: 'head' as const,
          attrs: { rel: 'preload', as: 'font', type: 'font/woff2', crossorigin: true, href: `/${file}` },
        }));
      },
    },
  };
}

export default defineConfig({
  plugins: [react(), tailwindcss(), preloadFont()],
  // The Host header is kept, so that a write through the proxy still counts as coming from its own site.
  server: { host: '127.0.0.1', proxy: { '/api': { target: apiOrigin, changeOrigin: false } } },
  preview: { host: '127.0.0.1', proxy: { '/api': { target: apiOrigin, changeOrigin: false } } },
  build: {
    outDir: 'dist',
    // Every browser that knows light-dark() knows modulepreload as well.
    modulePreload: { polyfill: false },
    emptyOutDir: true,
    // The Content-Security-Policy allows images, but no fonts or scripts, from data: addresses.
    assetsInlineLimit: 0,
  },
  test: {
    environment: 'jsdom',
    setupFiles: [fileURLToPath(new URL('./src/test-setup.ts', import.meta.url))],
  },
});
