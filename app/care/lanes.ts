/** The thin lanes of the hour strip on the board, top to bottom, always in this order. */
export const lanes = ['Inner cannula', 'Cuff', 'Stoma and skin', 'Suction', 'Tube'] as const

export type Lane = (typeof lanes)[number]
