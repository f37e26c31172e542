import { sentence } from '../sentence.ts'
import { mouthCare, mouthFindings, type OralCareData } from './schema.ts'

/** The sentence of a round: what was done to the mouth, how it was found. */
export function oralCareSentence({ care, seen, note }: OralCareData): string {
  return [
    `Mouth care: ${care.map(act => lower(mouthCare[act])).join(', ')}.`,
    `Found ${seen.map(finding => lower(mouthFindings[finding])).join(', ')}.`,
    ...(note ? [sentence(note)] : []),
  ].join(' ')
}

const lower = (words: string): string => words.charAt(0).toLowerCase() + words.slice(1)
