/** The stages of the 2016 classification, least to most; the last two are not a depth. Numbers are Arabic, as that revision asks. */
export const pressureInjuryStages = ['stage-1', 'stage-2', 'stage-3', 'stage-4', 'unstageable', 'deep-tissue'] as const

export type PressureInjuryStage = (typeof pressureInjuryStages)[number]

/** What tells one stage from another. */
export interface StageText {
  readonly title: string
  readonly says: string
}

/**
 * Pressure injury stages after NPUAP (now NPIAP) 2016, in our own words; injuries under a device use the same stages.
 * Moisture damage, overgrown (granulation) tissue and injuries of mucosa are not staged and must not be coded here.
 */
export const pressureInjuryTexts: Readonly<Record<PressureInjuryStage, StageText>> = {
  'stage-1': {
    title: 'Stage 1',
    says: 'Skin is whole; redness stays when pressed. In dark skin look for a change in warmth, firmness or feeling.',
  },
  'stage-2': {
    title: 'Stage 2',
    says: 'Part of the skin is lost: a moist pink or red bed, or a clear blister. No fat and no dead tissue to see.',
  },
  'stage-3': { title: 'Stage 3', says: 'The whole skin is lost and fat shows.' },
  'stage-4': {
    title: 'Stage 4',
    says: 'The whole skin is lost and deeper tissue shows: fascia, muscle, tendon, cartilage or bone.',
  },
  unstageable: {
    title: 'Unstageable',
    says: 'The whole skin is lost, but dead tissue hides how deep it goes.',
  },
  'deep-tissue': {
    title: 'Deep tissue injury',
    says: 'A deep red, maroon or purple area which stays when pressed, with the skin whole or not.',
  },
}

/** Whether an injury goes to a wound or ENT specialist: all but stage 1 (product proposal). */
export function needsReferral(stage: PressureInjuryStage): boolean {
  return stage !== 'stage-1'
}
