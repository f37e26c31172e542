import type { ForChildren } from '../children.ts'

const BY_AGE =
  'NTSP: newborn 60 to 80, infant 80 to 100 mmHg; suction protocol (PMID 18196852): child 80 to 100, adolescent 80 to 120'

/** Vacuum by age (reference R-416), in mmHg. */
export const vacuumLowForChildren: ForChildren<number> = {
  byAge: { neonate: 60, infant: 80, child: 80, adolescent: 80 },
  min: 40,
  source: { says: BY_AGE, standing: 'published' },
}

export const vacuumWarnForChildren: ForChildren<number> = {
  byAge: { neonate: 80, infant: 100, child: 100, adolescent: 120 },
  min: 60,
  max: 150,
  source: { says: BY_AGE, standing: 'published' },
}

export const vacuumVeryHighForChildren: ForChildren<number> = {
  byAge: { neonate: 120, infant: 120, child: 120, adolescent: 120 },
  min: 80,
  max: 200,
  source: {
    says: 'AARC clinical practice guideline on suctioning, 2022: below 120 mmHg in newborns and children',
    standing: 'published',
  },
}

/** Share of the inside diameter by age (reference R-411), in %. */
export const catheterShareForChildren: ForChildren<number> = {
  byAge: { neonate: 70, infant: 70, child: 50, adolescent: 50 },
  source: {
    says: 'AARC 2010: below 70% in infants, below 50% in children; AARC 2022 keeps 70% for newborns',
    standing: 'published',
  },
}
