import { numberSetting } from '../policy.ts'
import { tiesMostFingers } from '../stoma-and-skin/settings.ts'

export const tieChangeInterval = numberSetting({
  name: 'ties-change-interval',
  label: 'Ties or holder changed every',
  unit: 'h',
  default: 24,
  min: 24,
  max: 168,
  personal: true,
  affects: 'Ties change: when the next one is due. Soiled or wet ties are changed at once.',
  source: {
    says: 'Royal Marsden Manual, ch. 12: when soiled or wet; daily in many hospital policies',
    standing: 'common practice',
  },
})

export const tieSettings = [tieChangeInterval, tiesMostFingers]
