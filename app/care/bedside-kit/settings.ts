import { numberSetting } from '../policy.ts'
import { vacuumLow } from '../suction/settings.ts'

export const KIT_SOURCE = "St George's NHS, emergency equipment: stays with the patient at all times"

export const kitAfterEvent = numberSetting({
  name: 'bedside-kit-after-event',
  label: 'Bedside kit checked after admission, a tube change, a move or an emergency within',
  unit: 'min',
  default: 30,
  min: 5,
  max: 120,
  affects: 'Bedside kit check: when it is due after an event.',
  source: {
    says: 'NHS Greater Glasgow and Clyde: ready before the handover, and stay until it is; after use by common practice; the minutes are a proposal',
    standing: 'product proposal',
  },
})

export const kitMissingWithin = numberSetting({
  name: 'bedside-kit-missing-within',
  label: 'What is missing at the bedside is there within',
  unit: 'min',
  default: 15,
  min: 5,
  max: 60,
  affects: 'Bedside kit: next check after one that was not complete; past it the charge nurse is told.',
  source: { says: 'No published number', standing: 'product proposal' },
})

export const kitSettings = [kitAfterEvent, kitMissingWithin, vacuumLow]
