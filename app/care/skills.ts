/** What staff around a tracheostomy are assessed in (domain section 7.4), by stored name. Never renamed after release. */
export const skills = {
  'tube types': 'Tube types and their parts',
  'bedside checks': 'Bedside checks',
  suction: 'Suction',
  'inner cannula': 'Inner cannula',
  'stoma care': 'Stoma, dressing and ties',
  'cuff management': 'Cuff management',
  humidification: 'Humidification',
  'valve and cap': 'Speaking valve and cap',
  'red flags': 'Recognising red flags',
  'emergency algorithm': 'Emergency algorithm, both forms (simulation)',
  laryngectomy: 'Laryngectomy',
  'tube change, assisting': 'Tube change, assisting',
  'tube change, performing': 'Tube change, performing',
  decannulation: 'Removal of the tube for good',
  documentation: 'Documentation',
} as const satisfies Readonly<Record<string, string>>

/** A skill by its stored name. */
export type Skill = keyof typeof skills

/** Levels of a sign-off: works under supervision, works alone, or works alone and assesses others. */
export const levels = {
  supervised: 'Under supervision',
  independent: 'Independent',
  assessor: 'Independent, and assesses others',
} as const
export type Level = keyof typeof levels

/** How somebody stands in a skill: `supervised` is signed off, but not to work alone. */
export type CompetenceStanding = 'held' | 'supervised' | 'out of date' | 'missing'

export const standingWords = {
  held: 'signed off',
  supervised: 'signed off under supervision only',
  'out of date': 'sign-off out of date',
  missing: 'no sign-off',
} as const satisfies Readonly<Record<CompetenceStanding, string>>
