import { expect, test } from 'vitest'
import { urgentSteps } from './act-now.ts'
import type { ExplainedWarning } from './why-warnings.ts'

const warning = (name: string, action: string, level: ExplainedWarning['level'] = 'red'): ExplainedWarning => ({
  name,
  level,
  action,
  cause: `Cause of ${name}.`,
})

test.each<[string, readonly ExplainedWarning[], readonly string[]]>([
  ['nothing', [], []],
  ['no red one', [warning('low', 'Add air.', 'amber')], []],
  ['one red one', [warning('blocked', 'Call for help.')], ['Call for help.: blocked']],
  [
    'two that ask for the same',
    [warning('blocked', 'Call for help.'), warning('distress', 'Call for help.')],
    ['Call for help.: blocked, distress'],
  ],
  [
    'the same with another between them',
    [warning('blocked', 'Call.'), warning('bleed', 'Leave the tube in.'), warning('distress', 'Call.')],
    ['Call.: blocked, distress', 'Leave the tube in.: bleed'],
  ],
])('of %s each instruction is said once', (_, warnings, expected) => {
  const steps = urgentSteps(warnings)
  expect(steps.map(({ action, reasons }) => `${action}: ${reasons.map(({ name }) => name).join(', ')}`)).toEqual(
    expected,
  )
})
