import { aboveCuffSuction } from './above-cuff-suction/kind.ts'
import { adverseEvent } from './adverse-event/kind.ts'
import { afterRemoval } from './after-removal/kind.ts'
import { bedHeadSign } from './bed-head-sign/kind.ts'
import { bedsideKit } from './bedside-kit/kind.ts'
import { carePlan } from './care-plan/kind.ts'
import { coughStrength } from './cough-strength/kind.ts'
import { cuffPressure } from './cuff-pressure/kind.ts'
import { cuffStateKind } from './cuff-state/kind.ts'
import { decannulation } from './decannulation/kind.ts'
import { decannulationReadiness } from './decannulation-readiness/kind.ts'
import { deferral } from './deferral/kind.ts'
import { freeNote } from './free-note/kind.ts'
import { generalSettings } from './general-settings.ts'
import { humidification } from './humidification/kind.ts'
import { innerCannula } from './inner-cannula/kind.ts'
import type { AnyCareKind, TaskRule } from './kind.ts'
import { observations } from './observations/kind.ts'
import { oralCare } from './oral-care/kind.ts'
import type { AnySetting } from './policy.ts'
import type { PolicyCheck } from './policy-check.ts'
import { secretionGrade } from './secretion-grade/kind.ts'
import { stomaAndSkin } from './stoma-and-skin/kind.ts'
import { suction } from './suction/kind.ts'
import { ties } from './ties/kind.ts'
import { toleranceChecks, toleranceSettings } from './tolerance-settings.ts'
import { transferChecklist } from './transfer-checklist/kind.ts'
import { tubeChange } from './tube-change/kind.ts'
import { tubeChangePlan } from './tube-change-plan/kind.ts'
import { warningAnswer } from './warning-answer/kind.ts'
import { waterCuff } from './water-cuff/kind.ts'
import { weaningPlan } from './weaning-plan/kind.ts'
import { weaningTrial } from './weaning-trial/kind.ts'

/** Every kind of care, in the order of lists and lanes. Adding one is a folder and a line here. */
export const careKinds = [
  innerCannula,
  cuffPressure,
  cuffStateKind,
  waterCuff,
  stomaAndSkin,
  ties,
  suction,
  secretionGrade,
  coughStrength,
  aboveCuffSuction,
  humidification,
  oralCare,
  observations,
  bedsideKit,
  tubeChange,
  tubeChangePlan,
  weaningPlan,
  weaningTrial,
  decannulationReadiness,
  decannulation,
  afterRemoval,
  transferChecklist,
  bedHeadSign,
  adverseEvent,
  freeNote,
  deferral,
  warningAnswer,
  carePlan,
] as const satisfies readonly AnyCareKind[]

export type KindSlug = (typeof careKinds)[number]['slug']

const bySlug: ReadonlyMap<string, AnyCareKind> = new Map(careKinds.map(kind => [kind.slug, kind]))

/** The kind stored or addressed as `slug`, if there is one. */
export function findKind(slug: string): AnyCareKind | undefined {
  return bySlug.get(slug)
}

/** Every setting that some kind reads, once each, in the order of the kinds. */
export const careSettings: readonly AnySetting[] = [
  ...new Set([
    ...careKinds.flatMap((kind: AnyCareKind) => kind.settings ?? []),
    ...toleranceSettings,
    ...generalSettings,
  ]),
]

/** Every check of settings that must fit together. */
export const careChecks: readonly PolicyCheck[] = [
  ...careKinds.flatMap((kind: AnyCareKind) => kind.checks ?? []),
  ...toleranceChecks,
]

export interface KindTask {
  readonly kind: AnyCareKind
  readonly rule: TaskRule
}

/** Every kind of due care with the kind that charts it. */
export const careTasks: readonly KindTask[] = careKinds.flatMap((kind: AnyCareKind) =>
  (kind.tasks ?? []).map(rule => ({ kind, rule })),
)
