import { expect, test } from 'vitest'
import { deviceWords } from './device.ts'

test.each([
  ['Mozilla/5.0 (Windows NT 10.0; Win64; x64; rv:140.0) Gecko/20100101 Firefox/140.0', 'Firefox on Windows'],
  [
    'Mozilla/5.0 (X11; Linux x86_64) AppleWebKit/537.36 (KHTML, like Gecko) Chrome/156.0.0.0 Safari/537.36',
    'Chromium on Linux',
  ],
  [
    'Mozilla/5.0 (iPad; CPU OS 18_0 like Mac OS X) AppleWebKit/605.1.15 (KHTML, like Gecko) Version/18.0 Mobile/15E148 Safari/604.1',
    'Safari on iPad',
  ],
  ['Mozilla/5.0 (Linux; Android 15) AppleWebKit/537.36 Chrome/150.0.0.0 Mobile Safari/537.36', 'Chromium on Android'],
  ['curl/8.0', 'An unknown device'],
  [null, 'An unknown device'],
])('%s', (userAgent, words) => {
  expect(deviceWords(userAgent)).toBe(words)
})
