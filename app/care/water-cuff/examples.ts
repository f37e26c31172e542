import type { WaterCuffData } from './schema.ts'

/** The plain case that other examples vary: as much in as out, and as prescribed. */
export const plainFilling: WaterCuffData = { prescribedMl: 5, removedMl: 5, instilledMl: 5, leak: 'no' }

export const waterCuffExamples: readonly WaterCuffData[] = [
  plainFilling,
  { prescribedMl: 5, removedMl: 3.5, instilledMl: 5, leak: 'yes', note: 'Voice heard before.' },
  { prescribedMl: 5, removedMl: 5, instilledMl: 0, leak: 'no' },
]
