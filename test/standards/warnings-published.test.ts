import { expect, test } from 'vitest'
import { clearedBlock } from '#app/care/adverse-event/examples.ts'
import { adverseEvent } from '#app/care/adverse-event/kind.ts'
import { wholeKit } from '#app/care/bedside-kit/examples.ts'
import { bedsideKit } from '#app/care/bedside-kit/kind.ts'
import { cuffPressure } from '#app/care/cuff-pressure/kind.ts'
import { humidification } from '#app/care/humidification/kind.ts'
import { replacedWithNew } from '#app/care/inner-cannula/examples.ts'
import { innerCannula } from '#app/care/inner-cannula/kind.ts'
import type { StoredEntry } from '#app/care/kind.ts'
import { aContext, anEntry, aTube } from '#app/care/make.ts'
import { secretionGrade } from '#app/care/secretion-grade/kind.ts'
import { usualCheck } from '#app/care/stoma-and-skin/examples.ts'
import { stomaAndSkin } from '#app/care/stoma-and-skin/kind.ts'
import { plainSuction } from '#app/care/suction/examples.ts'
import { suction } from '#app/care/suction/kind.ts'
import { usualLook as tieLook } from '#app/care/ties/examples.ts'
import { ties } from '#app/care/ties/kind.ts'
import { tubeChange } from '#app/care/tube-change/kind.ts'
import { tubeChanges } from '#app/care/tube-change/schema.ts'
import { standingWarnings } from '#app/rules/warnings.ts'
import { expectFound, type Found, fresh, gauge, grade, PLAN, topUp, tube, withTube } from './found.ts'

/*
 * Every row of the clinical reference 5.3 (amber and blue, with what is red of it): what was found is taken by the form and
 * warned of at that level. Sources of the rules stand in the reference; the words are its suggestions.
 */

const OTHER_CANNULA = `This cannula is not made for this tube. Change it now for the matching one. ${PLAN}`

const found: readonly Found[] = [
  [
    'cuff above 30',
    cuffPressure,
    { ...gauge, found: 34 },
    'amber',
    'Let air out slowly to 20 to 30 cmH2O and check again in 30 minutes.',
  ],
  [
    'cuff below 20',
    cuffPressure,
    { ...gauge, found: 16 },
    'amber',
    'Add air to 20 to 30 cmH2O. If it keeps falling, check tube and pilot line.',
  ],
  [
    'needs the limit to seal',
    cuffPressure,
    { ...gauge, found: 30, leak: 'yes' },
    'amber',
    'Do not add more air. Ask a doctor for a review of tube size and position.',
  ],
  [
    'two top-ups in 12 h',
    cuffPressure,
    { ...gauge, found: 15, leftAt: 24 },
    'amber',
    'Do not add more air. Ask a doctor for a review of tube size and position.',
    [tube, topUp('06:00')],
  ],
  [
    'inner cannula heavy',
    innerCannula,
    { ...replacedWithNew, condition: 'heavy' },
    'amber',
    'Fit a clean inner cannula. Check again in 2 hours. Review humidity.',
  ],
  [
    'inner cannula blocked',
    innerCannula,
    { ...replacedWithNew, condition: 'blocked' },
    'amber',
    'Fit a clean inner cannula. Check again in 2 hours. Review humidity.',
  ],
  [
    'more than 3 mL of air',
    cuffPressure,
    { ...gauge, found: 15, leftAt: 24, airMl: 3.5 },
    'amber',
    'Do not add more air. Ask a doctor for a review of tube size and position.',
  ],
  ['inner cannula of another size', innerCannula, { ...replacedWithNew, size: '6.0' }, 'red', OTHER_CANNULA],
  ['inner cannula absent', tubeChange, aTube({ innerCannula: 'none' }), 'amber', 'Fit the correct inner cannula now.'],
  [
    'absent, hub on it',
    tubeChange,
    aTube({ innerCannula: 'none', connector: 'inner' }),
    'red',
    `Fit the correct inner cannula now. Without it the bag may not connect. ${PLAN}`,
  ],
  ['inner cannula of another line', innerCannula, { ...replacedWithNew, line: 'Halden' }, 'red', OTHER_CANNULA],
  ['the same as an event', adverseEvent, { ...clearedBlock, event: 'wrong cannula' }, 'red', OTHER_CANNULA],
  [
    'disposable cleaned',
    innerCannula,
    { ...replacedWithNew, act: 'cleaned' },
    'amber',
    'This is single use. Replace it with a new one.',
  ],
  [
    'fenestrated inner, suction',
    suction,
    { ...plainSuction, innerCannula: 'fenestrated' },
    'amber',
    'Change to the plain inner cannula before suction.',
    [withTube({ fenestrated: 'yes' })],
  ],
  [
    'catheter too large',
    suction,
    { ...plainSuction, catheter: '14 Fr' },
    'amber',
    'Largest size for this tube is 12 Fr.',
  ],
  ['vacuum above 200', suction, { ...plainSuction, vacuum: 210 }, 'amber', ''],
  ['vacuum above 150', suction, { ...plainSuction, vacuum: 160 }, 'amber', 'Turn suction down to 80 to 150 mmHg.'],
  [
    'first change early',
    tubeChange,
    aTube({ reason: 'first change' }),
    'amber',
    'Ask ENT or ICU before changing. If it is done, ask them to review today.',
    [fresh],
  ],
  ['kit item missing', bedsideKit, { ...wholeKit, complete: 'no', missing: ['spare same'], owner: 'B' }, 'amber', ''],
  [
    'pressure injury stage 2',
    stomaAndSkin,
    { ...usualCheck, appearance: ['redness'], skin: 'pressure injury', stage: 'stage-2', findingSite: 'flange left' },
    'amber',
    '',
  ],
  [
    'deep tissue injury',
    stomaAndSkin,
    {
      ...usualCheck,
      appearance: ['redness'],
      skin: 'pressure injury',
      stage: 'deep-tissue',
      findingSite: 'flange left',
    },
    'amber',
    '',
  ],
  ['no humidification', humidification, { method: 'none' }, 'amber', ''],
  [
    'new green secretions',
    suction,
    { ...plainSuction, colour: 'green' },
    'amber',
    'Ask a doctor to see the patient this shift. Review humidity.',
  ],
  [
    'new green at a grading',
    secretionGrade,
    { ...grade, colour: 'green', flags: ['none'] },
    'amber',
    'Ask a doctor to see the patient this shift. Review humidity.',
  ],
  [
    'feed-coloured',
    secretionGrade,
    { ...grade, flags: ['feed'] },
    'amber',
    'Ask a doctor and the speech-language therapist to see the patient this shift.',
  ],
  [
    'new thick secretions',
    suction,
    { ...plainSuction, consistency: 'thick' },
    'amber',
    'Ask a doctor to see the patient',
  ],
  ['feed-coloured at suction', suction, { ...plainSuction, colour: 'feed' }, 'amber', 'Ask a doctor and the speech'],
  ['infection suspected', stomaAndSkin, { ...usualCheck, appearance: ['redness', 'pus'] }, 'amber', ''],
  ['ties too tight', ties, { ...tieLook, fingers: 'none' }, 'amber', ''],
  ['ties loose', ties, { ...tieLook, fingers: 'more than two' }, 'amber', ''],
]

test.each(found.map(row => [row[0], row] as const))('found: %s (%#)', (_, row) => {
  expectFound(row)
})

const since = (day: string, more = {}) => anEntry(tubeChanges, `${day} 10:00`, aTube(more))
const blocked = (when: string) => anEntry(innerCannula, when, { ...replacedWithNew, condition: 'blocked' })
const out = (when: string) =>
  anEntry(adverseEvent, when, { ...clearedBlock, event: 'unplanned removal', tubeNow: 'in' })

// What stands by time or by what came again; looked at on 10-Mar-2026.
test.each<[string, readonly StoredEntry[], 'amber' | 'blue', RegExp, RegExp?]>([
  ['dwell, 8 days left', [since('2026-02-18')], 'blue', /never/],
  ['dwell, 7 days left', [since('2026-02-17')], 'blue', /^Plan the tube change/],
  ['dwell, 2 days left', [since('2026-02-12')], 'amber', /^Plan the tube change/],
  ['dwell, limit day', [since('2026-02-10')], 'amber', /due today/],
  [
    'dwell past limit',
    [since('2026-02-09')],
    'amber',
    /^Tell the tracheostomy team today/,
    /^Tube is 29 days in; limit is 28/,
  ],
  ['sutures on day 7', [since('2026-03-03', { sutures: 'in place' })], 'amber', /never/],
  ['sutures on day 8', [since('2026-03-02', { sutures: 'in place' })], 'amber', /flange sutures today/],
  [
    'a second block within 24 h',
    [tube, blocked('2026-03-09 11:00'), blocked('11:00')],
    'amber',
    /^Ask the tracheostomy/,
  ],
  ['a second block after more than 24 h', [tube, blocked('2026-03-09 10:59'), blocked('11:00')], 'amber', /never/],
  ['out twice in 7 days', [tube, out('2026-03-03 13:00'), out('09:00')], 'amber', /^Ask the tracheostomy specialist/],
  ['out twice in more than 7 days', [tube, out('2026-03-03 09:00'), out('10:00')], 'amber', /never/],
])('stands: %s', (_, record, level, action, cause = /./) => {
  const standing = standingWarnings(aContext(record, '11:30')).filter(
    warning => warning.level === level && action.test(warning.action) && cause.test(warning.cause),
  )
  expect(standing).toHaveLength(action.source === 'never' ? 0 : 1)
})
