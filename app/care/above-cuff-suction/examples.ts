import type { AboveCuffData } from './schema.ts'

/** The plain case that other examples vary. */
export const plainVolume: AboveCuffData = { volumeMl: 4, port: 'open', colour: 'clear', blood: 'none' }

export const aboveCuffExamples: readonly AboveCuffData[] = [
  plainVolume,
  { volumeMl: 0, port: 'blocked', blood: 'none', note: 'Air would not go through either.' },
  { volumeMl: 12.5, port: 'cleared', colour: 'feed', blood: 'streaks' },
]
