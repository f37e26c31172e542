// npm start: everything from a fresh clone to the application in a browser.
import { built } from './build.mjs'
import { launch } from './launch.mjs'
import { step } from './steps.mjs'

await launch({
  mode: 'production',
  before: end => step('Application', async () => [await built(end), undefined]),
  server: ['tsx', 'server.ts'],
  waits: true,
})
