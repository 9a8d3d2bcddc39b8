import { defineConfig } from 'vite'

/** The server as plain JavaScript; packages stay outside and are loaded from node_modules. */
export default defineConfig({
  publicDir: false,
  build: {
    ssr: true,
    outDir: 'dist/server',
    emptyOutDir: true,
    target: 'node20',
    minify: false,
    rolldownOptions: {
      input: { main: 'server/main.ts', seed: 'server/database/seed.ts' },
      output: { entryFileNames: '[name].js', chunkFileNames: 'chunks/[name]-[hash].js' },
    },
  },
})
