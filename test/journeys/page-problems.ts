import type { Page } from 'playwright-core'
import { axeProblems } from './browser.ts'

const DESK = { width: 1440, height: 900 }
/** WCAG 2.2, 1.4.10: no scrolling sideways at 320 CSS pixels. */
const NARROW = { width: 320, height: 640 }

/** What is wrong with a page as it stands, on a desk and on the narrowest phone, by day and by night. Leaves it narrow, by night. */
export async function pageProblems(page: Page): Promise<string[]> {
  const desk = await problemsAt(page, DESK)
  const narrow = [...(await problemsAt(page, NARROW)), ...(await tooWide(page))]
  return [...desk.map(problem => `desk, ${problem}`), ...narrow.map(problem => `320 px, ${problem}`)]
}

async function problemsAt(page: Page, size: { width: number; height: number }): Promise<string[]> {
  await page.setViewportSize(size)
  await inTheme(page, 'day')
  const byDay = [...(await axeProblems(page)), ...(await smallTargets(page))]
  // Colours are all that differs by night.
  await inTheme(page, 'night')
  const byNight = await axeProblems(page, ['color-contrast'])
  return [...byDay.map(problem => `by day: ${problem}`), ...byNight.map(problem => `by night: ${problem}`)]
}

function inTheme(page: Page, theme: 'day' | 'night'): Promise<void> {
  return page.evaluate(name => document.documentElement.setAttribute('data-theme', name), theme)
}

/**
 * Whatever can be seen and tapped, and is less than 44 by 44 CSS pixels; a label is tapped for what it labels. WCAG 2.2, 2.5.8
 * would leave out links within a sentence; there are none.
 */
function smallTargets(page: Page): Promise<string[]> {
  return page.evaluate(() => {
    const targets = document.querySelectorAll('a[href], button, input:not([type=hidden]), select, textarea, summary')
    return [...targets].flatMap(target => {
      if (!target.checkVisibility({ visibilityProperty: true })) return []
      const { width, height } = (target.closest('label') ?? target).getBoundingClientRect()
      if (Math.round(width) >= 44 && Math.round(height) >= 44) return []
      const words =
        target.getAttribute('aria-label') ?? target.closest('label')?.textContent ?? target.textContent ?? ''
      return [`${target.localName} "${words.trim()}" is ${Math.round(width)} by ${Math.round(height)}`]
    })
  })
}

/** What reaches past the right edge, innermost elements only. */
function tooWide(page: Page): Promise<string[]> {
  return page.evaluate(() => {
    const room = document.documentElement.clientWidth
    if (document.documentElement.scrollWidth <= room) return []
    const wide = [...document.querySelectorAll('body *')].filter(
      element => element.getBoundingClientRect().right > room + 1 && !element.closest('svg, [class*=overflow]'),
    )
    const innermost = wide.filter(element => ![...element.children].some(child => wide.includes(child)))
    return [
      `wider than ${room} px: ${innermost.map(({ localName, id, className }) => `${localName}#${id}.${className}`).join(' | ')}`,
    ]
  })
}
