import { expect, test } from 'vitest'
import { vacuumClass, vacuumMmHg } from './vacuum.ts'

const adult = { warnAbove: 150, confirmAbove: 200 }

test.each([
  [120, 'mmHg', 'in range'],
  [150, 'mmHg', 'in range'],
  [151, 'mmHg', 'high'],
  [200, 'mmHg', 'high'],
  [201, 'mmHg', 'to confirm'],
  [20, 'kPa', 'in range'],
  [20.2, 'kPa', 'high'],
  [27, 'kPa', 'to confirm'],
] as const)('a vacuum of %d %s is %s', (value, unit, stands) => {
  expect(vacuumClass(vacuumMmHg(value, unit), adult)).toBe(stands)
})
