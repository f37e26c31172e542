import { sentence } from '../sentence.ts'
import type { WaterCuffData } from './schema.ts'

/** The sentence of a filling: water out, water in, prescribed, leak. */
export function waterCuffSentence({ prescribedMl, removedMl, instilledMl, leak, note }: WaterCuffData): string {
  const filled = instilledMl === 0 ? 'left empty' : `${instilledMl} mL put in`
  return [
    `Water cuff: ${removedMl} mL removed, ${filled}; prescribed ${prescribedMl} mL.`,
    ...(leak === 'yes' ? ['Leak or voice with the cuff up.'] : []),
    ...(note ? [sentence(note)] : []),
  ].join(' ')
}
