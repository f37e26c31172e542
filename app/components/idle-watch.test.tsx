import { act, render, screen } from '@testing-library/react'
import { afterEach, beforeEach, expect, test, vi } from 'vitest'
import { IdleWatch } from './idle-watch.tsx'

const now = new Date('2026-12-01T02:00:00.000Z')
const sent: string[] = []

class OnePage {
  onmessage: (() => void) | null = null
  postMessage() {}
  close() {}
}

beforeEach(() => {
  vi.useFakeTimers({ now })
  vi.stubGlobal('BroadcastChannel', OnePage)
  vi.stubGlobal('fetch', (path: string) => {
    sent.push(path)
    return Promise.resolve(
      path === '/draft' ? Response.json({ ended: false, kept: false }) : new Response(null, { status: 204 }),
    )
  })
})
afterEach(() => {
  vi.useRealTimers()
  vi.unstubAllGlobals()
  sent.length = 0
})

const later = (minutes: number) => act(() => vi.advanceTimersByTimeAsync(minutes * 60_000))

function open(endsAt = '2026-12-01T14:00:00.000Z') {
  render(<IdleWatch idleMinutes={60} warningMinutes={2} now={now} endsAt={new Date(endsAt)} zone="Europe/London" />)
}

test('two minutes before the end of an unused session it says when, and how to stay', async () => {
  open()
  await later(57)
  expect(screen.queryByRole('alert')).toBeNull()
  await later(1.1)
  expect(screen.getByRole('alert')).toHaveTextContent('You will be signed out at 03:00.')
  expect(sent).toEqual([])
})

test('staying signed in tells the server and takes the warning away', async () => {
  open()
  await later(58.5)
  await act(async () => screen.getByRole('button', { name: 'Stay signed in' }).click())
  expect(sent).toEqual(['/still-here'])
  expect(screen.queryByRole('alert')).toBeNull()
})

test('use is reported once a minute, and an unused page reports nothing', async () => {
  open()
  await later(10)
  expect(sent).toEqual([])
  act(() => {
    window.dispatchEvent(new Event('keydown'))
    window.dispatchEvent(new Event('keydown'))
  })
  await later(5)
  expect(sent).toEqual(['/still-here'])
})

test('the end of twelve hours cannot be put off', async () => {
  open('2026-12-01T02:30:00.000Z')
  await later(28.2)
  expect(screen.getByRole('alert')).toHaveTextContent('You will be signed out at 02:30.')
  expect(screen.queryByRole('button')).toBeNull()
})

test('a page that is left alone hands in what was typed, and stays when the session is used on another page', async () => {
  open()
  await later(60)
  expect(sent).toEqual(['/draft'])
  expect(screen.queryByRole('alert')).toBeNull()
})
