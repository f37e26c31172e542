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

/**
 * A tube or an inner cannula as somebody charted it: by its id in the catalogue, else by line and size as printed.
 * `inner cannula of a tube`: the disposable one that went in with the tube of that id, line and size.
 */
export interface Device {
  readonly device: 'tube' | 'inner cannula' | 'inner cannula of a tube'
  readonly id?: string | undefined
  readonly line: string
  readonly size: string
}

/** Something that can lie in a store or at a bed. */
export type UsedItem = { readonly supply: SupplyName } | Device

/** What an act took from the stock. */
export interface Used {
  readonly item: UsedItem
  readonly quantity: number
}

/** What a patient is going to need by the policy or their care plan, for as long as there is too little data to count. */
export interface PlannedUse {
  readonly item: UsedItem
  readonly perDay: number
}

/** One of a named item. */
export function oneOf(supply: SupplyName): Used {
  return { item: { supply }, quantity: 1 }
}

/** How often in a day something happens that is done every so many hours. */
export function timesADay(everyHours: number): number {
  return 24 / everyHours
}
