import { expect, test } from 'vitest'
import { isActivity, isFromElsewhere } from './request-kind.ts'

const own = 'https://ward.example'

test.each([
  ['own origin', { Origin: own }, false],
  ['own origin, said twice', { Origin: own, 'Sec-Fetch-Site': 'same-origin' }, false],
  ['a referrer withheld by our own page', { Origin: 'null', 'Sec-Fetch-Site': 'same-origin' }, false],
  ['only the relation', { 'Sec-Fetch-Site': 'same-origin' }, false],
  ['neither', {}, true],
  ['an origin withheld, relation unsaid', { Origin: 'null' }, true],
  ['a foreign origin', { Origin: 'https://elsewhere.example' }, true],
  ['the same host without TLS', { Origin: 'http://ward.example' }, true],
  [
    'a foreign origin that claims otherwise',
    { Origin: 'https://elsewhere.example', 'Sec-Fetch-Site': 'same-origin' },
    true,
  ],
  ['a neighbour', { 'Sec-Fetch-Site': 'same-site' }, true],
  ['another site', { 'Sec-Fetch-Site': 'cross-site' }, true],
  ['a bookmark', { 'Sec-Fetch-Site': 'none' }, true],
])('a write with %s', (_, headers: Record<string, string>, refused) => {
  expect(isFromElsewhere(new Request(`${own}/x`, { method: 'POST', headers }), own)).toBe(refused)
})

test('reading is allowed from anywhere', () => {
  expect(isFromElsewhere(new Request(`${own}/x`, { headers: { Origin: 'https://elsewhere.example' } }), own)).toBe(
    false,
  )
})

test.each([
  ['a link that was followed', 'GET', { 'Sec-Fetch-Dest': 'document', 'Sec-Fetch-User': '?1' }, '/board', true],
  ['a page that reloads itself', 'GET', { 'Sec-Fetch-Dest': 'document' }, '/board', false],
  ['a poll', 'GET', { 'Sec-Fetch-Dest': 'empty' }, '/board', false],
  ['a page without those headers', 'GET', { Accept: 'text/html,*/*' }, '/board', true],
  ['anything else without them', 'GET', { Accept: '*/*' }, '/board', false],
  ['a write', 'POST', { 'Sec-Fetch-Dest': 'empty' }, '/patients/1', true],
  ['the draft that is sent when nobody is there', 'POST', { 'Sec-Fetch-Dest': 'empty' }, '/draft', false],
])('%s', (_, method, headers: Record<string, string>, path, awake) => {
  expect(isActivity(new Request(`${own}${path}`, { method, headers }), path)).toBe(awake)
})
