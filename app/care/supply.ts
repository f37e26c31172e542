/** What is kept in the store by its name alone; tubes and inner cannulas are kept by the catalogue. Names are stored, never renamed. */
export const supplyItems = {
  'catheter-5-fr': 'Suction catheter 5 Fr',
  'catheter-6-fr': 'Suction catheter 6 Fr',
  'catheter-8-fr': 'Suction catheter 8 Fr',
  'catheter-10-fr': 'Suction catheter 10 Fr',
  'catheter-12-fr': 'Suction catheter 12 Fr',
  'catheter-14-fr': 'Suction catheter 14 Fr',
  'catheter-16-fr': 'Suction catheter 16 Fr',
  'catheter-18-fr': 'Suction catheter 18 Fr',
  exchanger: 'Heat and moisture exchanger',
  'tube-holder': 'Tube holder or ties',
  'stoma-dressing': 'Stoma dressing',
  'sterile-water': 'Sterile water 10 mL',
  'syringe-10-ml': 'Syringe 10 mL',
  'lubricating-gel': 'Water-soluble gel, sachet',
  'disconnection-wedge': 'Disconnection wedge',
} as const

export type SupplyName = keyof typeof supplyItems

/** What was charted as used, and could not be told from the catalogue: counted all the same, and shown as what it is. */
export const unidentified = {
  tube: 'tube-not-identified',
  innerCannula: 'inner-cannula-not-identified',
} as const

const words: ReadonlyMap<string, string> = new Map([
  ...Object.entries(supplyItems),
  [unidentified.tube, 'Tube, not identified'],
  [unidentified.innerCannula, 'Inner cannula, not identified'],
])

/** What a thing kept by name is called; undefined for any other name. */
export function supplyWords(name: string): string | undefined {
  return words.get(name)
}

/** A tube as it was charted: by its id in the catalogue, else by what is printed on it. */
export interface UsedTube {
  readonly device: 'tube'
  readonly id?: string | undefined
  readonly line: string
  readonly size: string
  readonly cuff: string
  readonly fenestrated: string
}

/**
 * An inner cannula as it was charted: by its id in the catalogue, else by line and size as printed, else as the disposable one
 * of its tube. `ofTube`: what it went into, which tells a plain one from a fenestrated one of the same size.
 */
export interface UsedCannula {
  readonly device: 'inner cannula'
  readonly id?: string | undefined
  readonly line: string
  readonly size: string
  readonly ofTube?: UsedTube | undefined
}

/** Something that can lie in a store or at a bed. */
export type UsedItem = { readonly supply: SupplyName } | UsedTube | UsedCannula

/** What an act took from the stock. */
export interface Used {
  readonly item: UsedItem
  readonly quantity: number
}

/** What a patient is going to need by the policy or their care plan, for as long as there is too little data to count. */
export interface PlannedUse {
  readonly item: UsedItem
  readonly perDay: number
  /** When the need for this very item began, such as with the tube in place; left out: with the stay. */
  readonly since?: Date
}

/** One of a named item. */
export function oneOf(supply: SupplyName): Used {
  return { item: { supply }, quantity: 1 }
}

/** How often in a day something happens that is done every so many hours. */
export function timesADay(everyHours: number): number {
  return 24 / everyHours
}
