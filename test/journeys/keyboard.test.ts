import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { chartedWords, formReady, openBoard, passphrase, sentenceToBeCharted, signedIn, visitor } from './bedside.ts'
import { launchedBrowser, type StartedApp, startedApp } from './browser.ts'

const cuff = /^Cuff pressure check/

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

interface Focused {
  readonly words: string
  readonly value: string
  /** Nothing in particular: the page before its first stop and after its last. */
  readonly isPage: boolean
  /** Its ring, or that of the chip around it, is at least two pixels wide and on the screen. */
  readonly isSeen: boolean
}

/** What has the focus, and whether one can see that it does. */
function focused(page: Page): Promise<Focused> {
  return page.evaluate(() => {
    const element = document.activeElement as HTMLElement
    const ringed = element.closest('label') ?? element
    const { outlineStyle, outlineWidth } = getComputedStyle(ringed)
    const box = ringed.getBoundingClientRect()
    const middle = document.elementFromPoint(box.x + box.width / 2, box.y + box.height / 2)
    const onTop = middle !== null && (ringed.contains(middle) || middle.contains(ringed))
    return {
      words: (element.getAttribute('aria-label') ?? ringed.textContent ?? '').trim().slice(0, 80) || element.id,
      isPage: element === document.body,
      value: (element as HTMLInputElement).value ?? '',
      isSeen: outlineStyle !== 'none' && Number.parseFloat(outlineWidth) >= 2 && onTop,
    }
  })
}

/** Presses Tab until what has the focus says this, and fails when a stop on the way cannot be seen. */
async function tabTo(page: Page, words: RegExp): Promise<void> {
  for (let stop = 1; stop <= 120; stop += 1) {
    await page.keyboard.press('Tab')
    const at = await focused(page)
    if (at.isPage) continue
    expect(at.isSeen, `the focus on "${at.words}"`).toBe(true)
    if (words.test(at.words)) return
  }
  throw new Error(`Nothing that says ${words} takes the focus`)
}

test('a cuff pressure is charted from signing in to the end with the keyboard alone', async () => {
  const { page, problems } = await visitor(browser, app)
  await page.goto('/sign-in')
  await tabTo(page, /^email$/)
  await page.keyboard.type('nurse.alder@example.org')
  await page.keyboard.press('Tab')
  await page.keyboard.type(passphrase)
  await page.keyboard.press('Enter')
  await page.waitForURL(url => url.pathname !== '/sign-in')
  await tabTo(page, /^Ward board$/)
  await page.keyboard.press('Enter')
  await page.getByRole('list', { name: 'Patients' }).waitFor()
  await tabTo(page, cuff)
  await page.keyboard.press('Enter')
  await formReady(page)
  expect((await focused(page)).words).toBe('care-found')
  await page.keyboard.type('26')
  await tabTo(page, /^Manometer$/)
  await page.keyboard.press('Space')
  const sentence = await sentenceToBeCharted(page)
  await tabTo(page, /^Chart pressure$/)
  await page.keyboard.press('Enter')
  expect(await chartedWords(page)).toContain(sentence)
  expect(problems).toEqual([])
})

test('the first stop of every page skips to its content', async () => {
  const { page } = await signedIn(browser, app, 'nurse.alder')
  await page.reload()
  await page.getByRole('heading', { name: 'My round' }).waitFor()
  await page.keyboard.press('Tab')
  expect(await focused(page)).toMatchObject({ words: 'Skip to the content', isSeen: true })
  await page.keyboard.press('Enter')
  await page.waitForFunction(() => document.activeElement?.id === 'main')
  await page.keyboard.press('Tab')
  expect(await page.evaluate(() => document.activeElement?.closest('main') !== null)).toBe(true)
})

test('a form with mistakes moves the focus to the list of them, and each leads to its field', async () => {
  const { page } = await signedIn(browser, app, 'nurse.alder')
  await openBoard(page)
  await page.getByRole('link', { name: cuff }).first().press('Enter')
  await formReady(page)
  await page.keyboard.type('340')
  await page.keyboard.press('Enter')
  await page.waitForFunction(() => document.activeElement?.id === 'errors')
  await page.keyboard.press('Tab')
  expect((await focused(page)).words).toMatch(/120/)
  await page.keyboard.press('Enter')
  await page.waitForFunction(() => document.activeElement?.id === 'care-found')
  expect(await focused(page)).toMatchObject({ value: '340', isSeen: true })
  expect(await page.locator('#care-found').getAttribute('aria-invalid')).toBe('true')
  expect(await page.getByRole('alert').getByRole('link').count()).toBe(2)
})
