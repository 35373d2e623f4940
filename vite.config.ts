import tailwindcss from '@tailwindcss/vite'
import react from '@vitejs/plugin-react'
import { defineConfig } from 'vite'

const API = `http://127.0.0.1:${process.env['EMBERLINE_API_PORT'] ?? '4500'}`

export default defineConfig({
  root: 'web',
  plugins: [react(), tailwindcss()],
  worker: { format: 'es' },
  build: { outDir: '../dist/web', emptyOutDir: true, target: 'es2023', manifest: true },
  server: {
    host: '127.0.0.1',
    strictPort: true,
    proxy: { '/api': API, '/mail': API },
  },
})
