import type { Warning } from '../warning.ts'
import type { OralCareData } from './schema.ts'

/** What a round of care of the mouth asks people to notice. */
export function oralCareWarnings({ seen }: OralCareData): readonly Warning[] {
  return [
    ...(seen.includes('bleeding') ? [bleeding] : []),
    ...(seen.includes('thrush') ? [patches] : []),
    ...(seen.includes('sore') ? [sore] : []),
  ]
}

const bleeding: Warning = {
  name: 'mouth-bleeding',
  level: 'amber',
  action: 'Find out where the blood comes from. From the airway or the opening, call for help and chart it there.',
  cause: 'Blood in the mouth may have come up past the tube.',
  source: 'Bontempo and Manning: every bleed counts as a warning bleed',
}

const patches: Warning = {
  name: 'mouth-patches',
  level: 'blue',
  action: 'Ask a doctor about the white patches this shift.',
  cause: 'White patches in the mouth may be thrush.',
  source: 'Common practice',
}

const sore: Warning = {
  name: 'mouth-sore',
  level: 'blue',
  action: 'Look what presses or rubs there, and look again next shift.',
  cause: 'A sore or an ulcer in the mouth.',
  source: 'Common practice',
}
