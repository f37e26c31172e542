/** Where a kind stands among all that can be charted, so that what is looked for is found among a few and not among thirty. */
export const chapters = ['At the bed', 'Tube', 'Weaning and removal', 'Events and plans'] as const

export type Chapter = (typeof chapters)[number]
