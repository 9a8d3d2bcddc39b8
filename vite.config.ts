import { fileURLToPath } from 'node:url'
import tailwind from '@tailwindcss/vite'
import react from '@vitejs/plugin-react'
import { defineConfig } from 'vite'

/** The client: `vite` serves it in development and hands /api to the server, `vite build` writes dist/client. */
export default defineConfig({
  plugins: [react(), tailwind()],
  resolve: { alias: { '@': fileURLToPath(new URL('src', import.meta.url)) } },
  build: { outDir: 'dist/client', emptyOutDir: true, manifest: true, sourcemap: false },
  server: {
    host: '127.0.0.1',
    strictPort: true,
    proxy: { '/api': { target: `http://127.0.0.1:${process.env.PORT ?? '4380'}`, changeOrigin: false } },
  },
})
