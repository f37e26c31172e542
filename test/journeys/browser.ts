import axe from 'axe-core'
import { type Browser, type BrowserContextOptions, chromium, type Page } from 'playwright-core'
import { CHROMIUM } from '../../database/run/debian-package.mjs'

export { changeRows, rowsOf, type StartedApp, startedApp } from './app.ts'

const FLAGS = [
  ...['--no-sandbox', '--disable-gpu', '--disable-quic', '--no-first-run', '--disable-background-networking'],
  ...['--disable-component-update', '--disable-sync', '--disable-dev-shm-usage'],
]

/** A browser without a window, with flags of its own besides the usual ones. Close it in `afterAll`. */
export function launchedBrowser(flags: readonly string[] = []): Promise<Browser> {
  return chromium.launch({ executablePath: CHROMIUM.program, args: [...FLAGS, ...flags] })
}

export interface OpenedPage {
  readonly page: Page
  /** What went wrong unseen so far: console errors, uncaught errors and violations of the content security policy. */
  readonly problems: string[]
}

/** A page in a context of its own: no cookies, and the size, zone or JavaScript setting that is asked for. */
export async function openedPage(browser: Browser, options: BrowserContextOptions = {}): Promise<OpenedPage> {
  const context = await browser.newContext({ locale: 'en-GB', timezoneId: 'Europe/London', ...options })
  const page = await context.newPage()
  page.setDefaultTimeout(30_000)
  const problems: string[] = []
  page.on('pageerror', error => problems.push(error.message))
  page.on('console', message => {
    if (message.type() === 'error') problems.push(message.text())
  })
  return { page, problems }
}

const RULES = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa', 'best-practice']

/**
 * What axe finds wrong with the page as it stands, one line for each element: `rule: element: why`. Looks at everything, or at
 * the rules that are named.
 */
export async function axeProblems(page: Page, only: readonly string[] = RULES): Promise<string[]> {
  const isThere = await page.evaluate(() => 'axe' in globalThis)
  if (!isThere) await page.evaluate(axe.source)
  const found = await page.evaluate(
    async runOnly => (await (globalThis as unknown as { axe: typeof axe }).axe.run({ runOnly })).violations,
    [...only],
  )
  return found.flatMap(({ id, nodes }) =>
    nodes.map(({ target, failureSummary }) => `${id}: ${target.join(' ')}: ${failureSummary ?? ''}`),
  )
}
