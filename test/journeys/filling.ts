import type { Page } from 'playwright-core'

/** Answers a chart form by the names of its fields: options are checked or chosen, everything else is typed. */
export async function answered(
  page: Page,
  answers: Readonly<Record<string, string | readonly string[]>>,
): Promise<void> {
  for (const [name, given] of Object.entries(answers)) {
    for (const value of [given].flat()) {
      const field = page.locator(`[name="care.${name}"]`)
      const option = page.locator(`input:is([type=radio], [type=checkbox])[name="care.${name}"][value="${value}"]`)
      if ((await option.count()) > 0) await option.check()
      else if ((await page.locator(`select[name="care.${name}"]`).count()) > 0) await field.selectOption(value)
      else await field.fill(value)
    }
  }
}
