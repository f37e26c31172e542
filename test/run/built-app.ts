import { built } from '../../database/run/build.mjs'
import { CHROMIUM, installed } from '../../database/run/debian-package.mjs'

/** What journeys need before the first of them: a browser, and a build of today's sources. */
export default async function setup() {
  installed(CHROMIUM)
  await built()
}
