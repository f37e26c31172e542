import { vi } from 'vitest'
import { sequelize } from '#database/sequelize.server.ts'

/** The day of the first tube. Clocks go back on day 20, the 25th of October: from 02:00 summer time to 01:00. */
const FIRST = Date.UTC(2026, 9, 5)
const DAY = 86_400_000
const HOUR = 3_600_000
const CLOCKS_BACK = 20

/** A time by the clock on the wall in London, on a day of the stay. */
export function at(day: number, time: string): Date {
  const [hours = 0, minutes = 0] = time.split(':').map(Number)
  const wall = FIRST + day * DAY + hours * HOUR + minutes * 60_000
  if (day === CLOCKS_BACK && hours === 1) throw new RangeError('This hour comes twice on that day')
  const isSummer = day < CLOCKS_BACK || (day === CLOCKS_BACK && hours < 1)
  return new Date(isSummer ? wall - HOUR : wall)
}

/**
 * Lets a test live through weeks: the clock of this process, which the application reads, and that of the database, which dates what
 * it stores, show what was set last. Timers run on.
 */
export function wallClock() {
  const shown = new WeakMap<object, number>()
  const hook = 'the clock on the wall'
  vi.useFakeTimers({ toFake: ['Date'] })
  sequelize.addHook('beforeQuery', hook, async (_options, query) => {
    const { connection } = query as unknown as { connection: { query(sql: string): Promise<unknown> } }
    const now = Date.now()
    if (shown.get(connection) === now) return
    await connection.query(`SET timestamp = ${now / 1000}`)
    shown.set(connection, now)
  })
  return {
    set: (moment: Date) => vi.setSystemTime(moment),
    stop() {
      sequelize.removeHook('beforeQuery', hook)
      vi.useRealTimers()
    },
  }
}
