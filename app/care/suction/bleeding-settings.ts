import { numberSetting, switchSetting } from '../policy.ts'

export const bleedWindowFrom = numberSetting({
  name: 'bleed-window-from',
  label: 'Bleeding may warn of a larger bleed from day',
  unit: 'days',
  default: 3,
  min: 0,
  max: 7,
  affects: 'Every warning of blood: at suction, at the stoma and on the inner cannula.',
  source: { says: 'Journal abstract on fistula of the innominate artery: 3 days to 6 weeks', standing: 'published' },
})

export const bleedWindowTo = numberSetting({
  name: 'bleed-window-to',
  label: 'Bleeding may warn of a larger bleed until day',
  unit: 'days',
  default: 42,
  min: 21,
  max: 90,
  affects: 'Every warning of blood: at suction, at the stoma and on the inner cannula.',
  source: {
    says: 'Massive bleeding from 3 days to 6 weeks is an artery fistula until proven otherwise; Bontempo and Manning: every bleed counts as a warning bleed',
    standing: 'published',
  },
})

export const streaksAreRed = switchSetting({
  name: 'bleed-streaks-red',
  label: 'Streaks of blood within those days are an emergency',
  unit: 'on or off',
  default: false,
  affects: 'Suction and inner cannula: streaks are amber, or red when on.',
  source: { says: 'Streaks only: doctor this shift; a hospital may raise it', standing: 'product proposal' },
})

export const bleedWatchHours = numberSetting({
  name: 'bleed-watch',
  label: 'A bleed is kept in sight after it has stopped for',
  unit: 'h',
  default: 48,
  min: 12,
  max: 168,
  affects: 'Every warning of blood: a warning bleed may be the first of two, hours or days apart.',
  source: {
    says: 'A warning bleed goes before more than half of massive ones (review of fistula of the innominate artery); the hours are a proposal',
    standing: 'product proposal',
  },
})

export const bleedingSettings = [bleedWindowFrom, bleedWindowTo, streaksAreRed, bleedWatchHours]
