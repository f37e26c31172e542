import { afterEach, beforeEach, expect, vi } from 'vitest'

// Whatever writes to console.error in a test has gone wrong unseen. A test that expects it asserts it, then clears it:
// vi.mocked(console.error).mockClear()
beforeEach(() => {
  vi.spyOn(console, 'error')
})

afterEach(() => {
  const { calls } = vi.mocked(console.error).mock
  vi.restoreAllMocks()
  expect(calls, 'console.error was called').toEqual([])
})
