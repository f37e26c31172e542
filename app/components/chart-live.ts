import { type FormEvent, type RefObject, useCallback, useEffect, useRef, useState } from 'react'
import { useFetcher } from 'react-router'
import type { AnyCareKind } from '#app/care/kind.ts'
import type { ChartAnswer, FormSigner } from '#app/charting/chart-answer.ts'
import { passwordFields } from '#app/charting/chart-form.ts'
import type { Calendar } from '#app/charting/performed-at.ts'
import { type LiveSentence, liveSentence } from '#app/charting/sentence.ts'
import type { ExplainedWarning } from '#app/rules/why-warnings.ts'

const WAIT_MS = 400 // until typing rests: long enough for two digits, short enough to see the warning before charting
const TICK_MS = 5000
const MINUTE_MS = 60_000

const momentFields = ['when', 'day', 'time', 'occurrence']

/** What a form under way says of itself. */
export interface ChartLive {
  /** The sentence as it stands; null until scripts run. */
  readonly sentence: LiveSentence | null
  /** What the server warns of, while the sentence is whole; null before it was asked. */
  readonly warnings: readonly ExplainedWarning[] | null
  /** The moment (ms) that the form shows as "Now". */
  readonly shownAt: number
  readonly onInput: (event: FormEvent<HTMLFormElement>) => void
  readonly onSubmit: () => void
}

interface Given {
  readonly kind: AnyCareKind
  readonly signer: FormSigner
  readonly calendar: Calendar
  /** The moment (ms) that the form was drawn with. */
  readonly openedAt: number
}

/**
 * Keeps sentence, warnings and "Now" true while a form is filled in. "Now" moves on with the minute until somebody says when
 * it was, or sends the form: a second sending has to say the same.
 */
export function useChartLive(
  { kind, signer, calendar, openedAt }: Given,
  form: RefObject<HTMLFormElement | null>,
): ChartLive {
  const [isHeld, setHeld] = useState(false)
  const [sentence, setSentence] = useState<LiveSentence | null>(null)
  const shownAt = useMoving(openedAt, isHeld)
  const { warnings, ask, keepQuiet } = usePreview(form)
  const read = useCallback(() => {
    if (!form.current) return null
    const now = new Date(Math.max(calendar.now.getTime(), shownAt))
    return liveSentence(kind, new FormData(form.current), signer, { ...calendar, now })
  }, [form, kind, signer, calendar, shownAt])
  const isReady = sentence?.ready === true

  useEffect(() => setSentence(read()), [read])
  // What a form opens with is asked about once; after that only what somebody types is, so that an idle page stays idle.
  useEffect(() => {
    if (isReady) ask()
  }, [isReady, ask])

  return {
    sentence,
    warnings: isReady ? warnings : null,
    shownAt,
    onInput: ({ target }) => {
      if (target instanceof Element && momentFields.includes(target.getAttribute('name') ?? '')) setHeld(true)
      const next = read()
      setSentence(next)
      if (next?.ready) ask()
    },
    onSubmit: () => {
      keepQuiet()
      setHeld(true)
    },
  }
}

/** The form without its files, which no preview needs. */
function textsOf(form: HTMLFormElement): FormData {
  const texts = new FormData()
  for (const [name, value] of new FormData(form)) if (typeof value === 'string') texts.append(name, value)
  return texts
}

/** Asks the server what it would warn of, once typing rests. */
function usePreview(form: RefObject<HTMLFormElement | null>) {
  const { data, submit } = useFetcher<ChartAnswer>()
  const waiting = useRef<number>(undefined)
  const keepQuiet = useCallback(() => window.clearTimeout(waiting.current), [])
  const ask = useCallback(() => {
    keepQuiet()
    waiting.current = window.setTimeout(() => {
      if (!form.current) return
      const body = textsOf(form.current)
      body.set('intent', 'preview')
      for (const name of passwordFields) body.delete(name)
      void submit(body, { method: 'post', defaultShouldRevalidate: false })
    }, WAIT_MS)
  }, [form, submit, keepQuiet])
  useEffect(() => keepQuiet, [keepQuiet])
  return { warnings: data?.is === 'previewed' ? data.warnings : null, ask, keepQuiet }
}

/** A moment (ms) that moves on in whole minutes, by the device's pace and not its clock, until it is held. */
function useMoving(from: number, isHeld: boolean): number {
  const [shown, setShown] = useState(from)
  useEffect(() => {
    if (isHeld) return
    const began = performance.now()
    const move = () => {
      const at = from + performance.now() - began
      setShown(Math.max(from, at - (at % MINUTE_MS)))
    }
    const timer = window.setInterval(move, TICK_MS)
    return () => window.clearInterval(timer)
  }, [from, isHeld])
  return shown
}
