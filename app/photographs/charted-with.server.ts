import type { Alongside } from '#database/entries.server.ts'
import type { Charting } from '#database/entry-outcome.server.ts'
import {
  type NewPhotograph,
  photographsAlongside,
  removeFiles,
  sweepFiles,
  writeFiles,
} from '#database/photographs.server.ts'

let sweptAt = 0
const SWEEP_EVERY_MS = 3_600_000

/**
 * Charts an act with its photographs: files first, their rows in the act's own transaction, and the files taken out again
 * when the act was not charted. Where it is not known whether it was, they stay until the sweep knows.
 */
export async function chartedWith(
  entry: { readonly id: string; readonly stayId: string },
  added: readonly NewPhotograph[],
  also: Alongside | undefined,
  chart: (alongside: Alongside | undefined) => Promise<Charting>,
): Promise<Charting> {
  if (added.length === 0) return chart(also)
  await writeFiles(added)
  const rows = photographsAlongside(entry, added)
  const charting = await chart(async transaction => {
    await also?.(transaction)
    await rows(transaction)
  })
  if (charting.outcome !== 'charted') await removeFiles(added)
  await sweptNowAndThen()
  return charting
}

async function sweptNowAndThen(): Promise<void> {
  const now = new Date()
  if (now.getTime() - sweptAt < SWEEP_EVERY_MS) return
  sweptAt = now.getTime()
  await sweepFiles(now)
}
