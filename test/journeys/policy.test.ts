import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { openBoard, patientOf, rowOf, rowsWith, signedIn } from './bedside.ts'
import { launchedBrowser, type StartedApp, startedApp } from './browser.ts'

const inspection = /^Inner cannula inspection/

let app: StartedApp
let browser: Browser

beforeAll(async () => {
  browser = await launchedBrowser()
  app = await startedApp()
})

afterAll(async () => {
  await browser.close()
  await app.stop()
})

/** How late the first inspection on the board is, in minutes, and whose it is. */
async function lateInspection(page: Page) {
  const row = rowsWith(page, /^Inner cannula inspection.* late$/).first()
  return { patient: await patientOf(row), late: await minutesLate(page, await patientOf(row)) }
}

async function minutesLate(page: Page, patient: string): Promise<number> {
  const words = await rowOf(page, patient).getByRole('link', { name: inspection }).textContent()
  const [, hours = '0', minutes = '0'] = words?.match(/(?:(\d+) h)? ?(?:(\d+) min)? late$/) ?? []
  return Number(hours) * 60 + Number(minutes)
}

/** What stands in the line of the inspection: tasks in force and by the draft, late in force and by the draft. */
async function whatIf(page: Page): Promise<number[]> {
  const tasks = page.getByRole('table', { name: 'Each task, in 14 days' })
  const cells = tasks.getByRole('row', { name: inspection }).getByRole('cell')
  return (await cells.allTextContents()).map(Number)
}

test.each([
  ['with scripts', true, '8', '6'],
  ['without scripts', false, '6', '4'],
])(
  '%s a version is drafted, compared, tried out and published, and the board follows',
  async (_, scripts, from, to) => {
    const { page, problems } = await signedIn(browser, app, 'specialist', { javaScriptEnabled: scripts })
    const board = await openBoard(page)
    const before = await lateInspection(page)

    await page.getByRole('link', { name: 'Policy', exact: true }).click()
    await page.getByRole('link', { name: 'Draft the next version' }).click()
    const every = page.getByRole('textbox', { name: 'Inner cannula looked at every', exact: true })
    expect(await every.inputValue()).toBe(from)
    await every.fill('60')
    await page.getByRole('button', { name: 'Save and compare' }).click()
    await page
      .getByRole('alert')
      .getByRole('link', { name: /^Inner cannula looked at every: .*1 to 24/ })
      .waitFor()
    expect(await every.inputValue()).toBe('60')
    await every.fill(to)
    await page.getByRole('button', { name: 'Save and compare' }).click()

    await page.getByText(`Inner cannula looked at every: from ${from} h to ${to} h.`).waitFor()
    const [tasksBefore = 0, tasksAfter = 0, lateBefore = 0, lateAfter = 0] = await whatIf(page)
    expect(tasksAfter).toBeGreaterThan(tasksBefore)
    expect(lateAfter).toBeGreaterThan(lateBefore)

    await page.getByLabel('Reviewer from this ward').selectOption({ label: 'Odalys Verstraeten, charge nurse' })
    await page.getByLabel('Reason').fill('Two blocked inner cannulas in a month')
    await page.getByRole('button', { name: 'Publish', exact: true }).click()
    await page.getByRole('status').filter({ hasText: 'Published.' }).waitFor()
    await page.getByText('Reviewed by Odalys Verstraeten, charge nurse').first().waitFor()

    await page.goto(board)
    // Sooner by what the interval is shorter; the window around it may shrink as well.
    const sooner = (Number(from) - Number(to)) * 60
    expect(await minutesLate(page, before.patient)).toBeGreaterThanOrEqual(before.late + sooner)
    await page.goto(before.patient)
    const why = page.getByRole('listitem').filter({ hasText: 'Inner cannula inspection' }).locator('details').first()
    expect(await why.textContent()).toContain(`Inner cannula looked at every: ${to} h. Policy.`)
    // The number out of range alone.
    expect(problems).toEqual([expect.stringContaining('status of 400')])
  },
)
