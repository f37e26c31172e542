import { reactRouter } from '@react-router/dev/vite'
import tailwindcss from '@tailwindcss/vite'
import { defineConfig } from 'vite'

export default defineConfig({
  plugins: [tailwindcss(), reactRouter()],
  // No data: URIs in what is built, so that the content security policy needs no exception for them.
  build: { assetsInlineLimit: 0 },
  // Every client dependency by name, or the first visit in development reloads into a second copy of React.
  optimizeDeps: {
    include: [
      'react',
      'react-dom',
      'react-dom/client',
      'react/jsx-runtime',
      'react/jsx-dev-runtime',
      'react-router',
      'react-router/dom',
      '@conform-to/react',
      '@conform-to/zod/v4',
      'dayjs',
      'dayjs/plugin/utc.js',
      'zod',
    ],
  },
})
