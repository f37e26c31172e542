import type { CatalogueInnerCannula, CatalogueTube } from '#app/catalogue/item.ts'

type OfLine = 'id' | 'lineId' | 'line' | 'maker' | 'gtin' | 'retiredAt' | 'version'

export type TubeSeed = Omit<CatalogueTube, OfLine> & { readonly retired?: boolean }
export type InnerCannulaSeed = Omit<CatalogueInnerCannula, OfLine>

export interface LineSeed {
  readonly line: string
  readonly maker: string
  readonly tubes: readonly TubeSeed[]
  readonly innerCannulas: readonly InnerCannulaSeed[]
  /** What the maker says goes together. */
  readonly fits: (tube: Pick<TubeSeed, 'size' | 'construction' | 'fenestrated'>, cannula: InnerCannulaSeed) => boolean
}

// Lines, makers and numbers are invented; no maker's tube is meant. The numbers are plausible beside published tables. A new
// item goes to the end of its line: GTINs and ids are counted from the start.

const fixed = { flange: 'fixed', insertionAid: true } as const
const single = {
  ...fixed,
  sizeSystem: 'ISO 5366',
  construction: 'single',
  innerCannula: null,
  idWithInner: null,
  fenestrated: 'no',
  connector: 'outer',
  longestUseDays: null,
  reusableInnerCannulas: 0,
} as const

/** A fenestrated cannula has no place in a tube without windows; a plain one closes the windows of one with them. */
const sameSizeAndWindows: LineSeed['fits'] = (tube, cannula) =>
  tube.construction === 'dual' &&
  tube.size === cannula.size &&
  (cannula.fenestrated === 'no' || tube.fenestrated === 'yes')

const mm = (value: number): string => value.toFixed(1)

/** Corvane Dual: ID with inner cannula, ID of the outer tube, OD, length. */
const corvaneSizes = [
  [6, 7, 9.3, 70],
  [7, 8, 10.3, 74],
  [8, 9, 11.3, 78],
  [9, 10, 12.3, 81],
  [10, 11, 13.3, 84],
] as const

const corvaneTube = (
  [idWithInner, idWithoutInner, od, lengthMm]: (typeof corvaneSizes)[number],
  cuff: TubeSeed['cuff'],
  fenestrated: TubeSeed['fenestrated'],
): TubeSeed => ({
  ...fixed,
  sizeSystem: 'ISO 5366',
  size: mm(idWithInner),
  construction: 'dual',
  innerCannula: 'disposable',
  ...{ idWithInner, idWithoutInner, od, lengthMm, cuff, fenestrated },
  connector: 'outer',
  longestUseDays: 29,
  reusableInnerCannulas: 0,
})

/** Dual, disposable inner cannulas, connector on the outer tube. The label allows 29 days. */
export const corvane: LineSeed = {
  line: 'Corvane Dual',
  maker: 'Quillmere Works',
  tubes: [
    ...corvaneSizes.flatMap(size => [corvaneTube(size, 'air', 'no'), corvaneTube(size, 'none', 'no')]),
    ...corvaneSizes.slice(1, 4).flatMap(size => [corvaneTube(size, 'air', 'yes'), corvaneTube(size, 'none', 'yes')]),
  ],
  innerCannulas: corvaneSizes.flatMap(([id]) =>
    (['no', 'yes'] as const)
      .filter(fenestrated => fenestrated === 'no' || (id > 6 && id < 10))
      .map(fenestrated => ({ size: mm(id), use: 'disposable' as const, fenestrated, packSize: 10 })),
  ),
  fits: sameSizeAndWindows,
}

/** Halden: label size, then as above. Inside and outside diameters are those of a published table of dual-cannula Jackson sizes. */
const haldenSizes = [
  ['4', 5, 6.7, 9.4, 65],
  ['6', 6.4, 8.1, 10.8, 76],
  ['8', 7.6, 9.1, 12.2, 81],
  ['10', 8.9, 10.7, 13.8, 81],
] as const

/** Dual, in Jackson sizes, two reusable inner cannulas that carry the connector. */
export const halden: LineSeed = {
  line: 'Halden',
  maker: 'Brannoch & Dey',
  tubes: haldenSizes.flatMap(([size, idWithInner, idWithoutInner, od, lengthMm]) =>
    (['no', 'yes'] as const).flatMap(fenestrated =>
      (['none', 'air'] as const).map(cuff => ({
        ...fixed,
        sizeSystem: 'Jackson' as const,
        size,
        construction: 'dual' as const,
        innerCannula: 'reusable' as const,
        ...{ idWithInner, idWithoutInner, od, lengthMm, cuff, fenestrated },
        connector: 'inner' as const,
        longestUseDays: null,
        reusableInnerCannulas: 2,
      })),
    ),
  ),
  innerCannulas: haldenSizes.flatMap(([size]) =>
    (['no', 'yes'] as const).map(fenestrated => ({ size, use: 'reusable' as const, fenestrated, packSize: 1 })),
  ),
  fits: sameSizeAndWindows,
}

const linnetTube = (
  id: number,
  od: number,
  lengthMm: number,
  rest: Partial<TubeSeed> & Pick<TubeSeed, 'cuff'>,
): TubeSeed => ({
  ...single,
  size: mm(id),
  idWithoutInner: id,
  od,
  lengthMm,
  ...rest,
})

/** Single cannula, with each kind of cuff, and a short tube for after laryngectomy, once without a connector. */
export const linnet: LineSeed = {
  line: 'Linnet',
  maker: 'Vastenhaug',
  tubes: [
    ...(
      [
        [6, 8.7, 70],
        [6.5, 9.2, 73],
        [7, 9.7, 75],
        [7.5, 10.2, 77],
        [8, 10.9, 79],
        [8.5, 11.4, 80],
        [9, 12.1, 82],
      ] as const
    ).flatMap(([id, od, lengthMm]) => [
      linnetTube(id, od, lengthMm, { cuff: 'air' }),
      linnetTube(id, od, lengthMm, { cuff: 'none' }),
    ]),
    ...(
      [
        [6, 9, 74],
        [7, 10, 80],
        [8, 11, 85],
      ] as const
    ).map(([id, od, lengthMm]) => linnetTube(id, od, lengthMm, { cuff: 'water' })),
    ...(
      [
        [7, 10.1, 76],
        [8, 11.2, 80],
      ] as const
    ).map(([id, od, lengthMm]) => linnetTube(id, od, lengthMm, { cuff: 'foam', longestUseDays: 28 })),
    ...[8, 9, 10].map(id => linnetTube(id, id + 2.5, 55, { cuff: 'none' })),
    linnetTube(9, 11.5, 48, { cuff: 'none', connector: 'none', insertionAid: false }),
    linnetTube(5.5, 8.1, 67, { cuff: 'none', retired: true }),
  ],
  innerCannulas: [],
  fits: () => false,
}

/** Longer, with an adjustable flange: single with air or water in the cuff, and dual with a disposable inner cannula. */
export const marrow: LineSeed = {
  line: 'Marrow Long',
  maker: 'Oskerry',
  tubes: [
    ...(
      [
        [6.5, 9.4],
        [7.5, 10.4],
        [8.5, 11.6],
      ] as const
    ).flatMap(([id, od]) =>
      (['air', 'water'] as const).map(cuff => linnetTube(id, od, 110, { cuff, flange: 'adjustable' })),
    ),
    ...(
      [
        [7, 8.2, 11.1],
        [8, 9.2, 12.1],
      ] as const
    ).map(([id, idWithoutInner, od]) => ({
      ...fixed,
      sizeSystem: 'ISO 5366' as const,
      size: mm(id),
      construction: 'dual' as const,
      innerCannula: 'disposable' as const,
      idWithInner: id,
      ...{ idWithoutInner, od, lengthMm: 120, cuff: 'air' as const, fenestrated: 'no' as const },
      connector: 'outer' as const,
      flange: 'adjustable' as const,
      longestUseDays: 29,
      reusableInnerCannulas: 0,
    })),
  ],
  innerCannulas: [7, 8].map(id => ({ size: mm(id), use: 'disposable', fenestrated: 'no', packSize: 10 })),
  fits: sameSizeAndWindows,
}
