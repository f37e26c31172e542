import type { Page } from 'playwright-core'

/** Counts what a thumb does on the page, whatever it hits. Digits of a number are counted by themselves. */
export async function countedTaps(page: Page): Promise<{ readonly all: number; readonly digits: number }> {
  const taps = { all: 0, digits: 0 }
  await page.exposeFunction('tapped', (isDigit: boolean) => {
    taps[isDigit ? 'digits' : 'all'] += 1
  })
  await page.evaluate(() => {
    const { tapped } = window as unknown as { tapped: (isDigit: boolean) => void }
    addEventListener(
      'pointerup',
      ({ target }) => tapped(target instanceof Element && target.closest('[aria-label^="Keys for"]') !== null),
      { capture: true },
    )
  })
  return taps
}
