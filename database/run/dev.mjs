// npm run dev: as npm start, with the development server, which shows each edit at once.
import { launch } from './launch.mjs'

const args = ['--host', process.env.HOST || '127.0.0.1', '--port', process.env.PORT || '3000']

await launch({ mode: 'development', server: ['node', 'node_modules/@react-router/dev/bin.js', 'dev', ...args] })
