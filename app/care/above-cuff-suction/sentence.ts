import { sentence } from '../sentence.ts'
import { secretionSentences } from '../suction/secretions.ts'
import type { AboveCuffData } from './schema.ts'

const ports: Readonly<Record<AboveCuffData['port'], readonly string[]>> = {
  open: [],
  cleared: ['Port was blocked, cleared.'],
  blocked: ['Port blocked.'],
}

/** The sentence of suction above the cuff: the volume, the port, what it looked like. */
export function aboveCuffSentence(data: AboveCuffData): string {
  return [
    `Suction above the cuff: ${data.volumeMl} mL.`,
    ...ports[data.port],
    ...secretionSentences({ colour: data.colour, blood: data.blood }),
    ...(data.note ? [sentence(data.note)] : []),
  ].join(' ')
}
