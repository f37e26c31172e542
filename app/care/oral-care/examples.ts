import type { OralCareData } from './schema.ts'

/** The most common round: looked at, moistened, nothing found. */
export const plainRound: OralCareData = { care: ['looked', 'moistened'], seen: ['clean'] }

export const oralCareExamples: readonly OralCareData[] = [
  plainRound,
  { care: ['looked', 'moistened', 'brushed'], seen: ['dry', 'coated'] },
  { care: ['looked', 'suctioned'], seen: ['thrush', 'sore'], note: 'Asked for a swab' },
  { care: ['suctioned'], seen: ['bleeding'] },
]
