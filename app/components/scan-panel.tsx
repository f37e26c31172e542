import { useEffect, useRef, useState } from 'react'
import { useFetcher, useLocation } from 'react-router'
import type { Typed } from '#app/charting/chart-form.ts'
import type { ScanSource } from '#app/scanning/scan-form.ts'
import { fillWords, NO_SCAN, type ScanView } from '#app/scanning/scan-view.ts'
import { Button, LinkButton } from './button.tsx'
import { Card } from './card.tsx'
import { FieldErrors } from './field-parts.tsx'
import { useHydrated } from './hydrated.ts'
import { ScanCamera } from './scan-camera.tsx'
import { ScanResult } from './scan-result.tsx'
import { TextField } from './text-field.tsx'
import { useWedge } from './use-wedge.ts'

export interface ScanPanelProps {
  /** `inner cannula` */
  readonly what: string
  /** Address of the form that is filled in. */
  readonly path: string
  readonly separatorKey: string | null
  readonly onFill: (answers: Typed) => void
}

/** Scanning inside a chart form. An item that is in order fills the form in by itself; one that is not has to be in place already. */
export function ScanPanel({ what, path, separatorKey, onFill }: ScanPanelProps) {
  const isHydrated = useHydrated()
  const { search } = useLocation()
  if (!isHydrated) {
    return (
      <div>
        <LinkButton href={`/scan?for=${encodeURIComponent(path + search)}`} size={48} reload>
          {`Scan the ${what}`}
        </LinkButton>
      </div>
    )
  }
  return <LivePanel {...{ what, path, separatorKey, onFill }} />
}

function LivePanel({ what, path, separatorKey, onFill }: ScanPanelProps) {
  const { view, send, isBusy } = useScan(path)
  const [isOpen, setOpen] = useState<'camera' | 'typing' | null>(null)
  useWedge(raw => send('scanner', raw), separatorKey)
  useFilledOnce(view, onFill)
  const read = (source: ScanSource) => (raw: string) => {
    setOpen(null)
    send(source, raw)
  }
  return (
    <Card>
      <div className="flex flex-wrap items-center gap-x-3 gap-y-2">
        <p className="min-w-48 flex-1">
          {isBusy ? 'Looking it up' : `Scan the ${what} at any time: line, size, lot and expiry are filled in.`}
        </p>
        <Button type="button" size={48} onClick={() => setOpen('camera')}>
          Use the camera
        </Button>
        <Button type="button" size={48} onClick={() => setOpen('typing')}>
          Type the code
        </Button>
      </div>
      <div className="mt-3 grid gap-3 empty:hidden">
        {isOpen === 'camera' && <ScanCamera onRead={read('camera')} onClose={() => setOpen(null)} />}
        {isOpen === 'typing' && <CodeField onRead={read('typed')} />}
        <FieldErrors id="scan-code" errors={view.error ? [view.error] : undefined} />
        <Outcome view={view} onFill={onFill} onReadBack={choice => send('typed', '', choice)} />
      </div>
    </Card>
  )
}

interface OutcomeProps {
  readonly view: ScanView
  readonly onFill: (answers: Typed) => void
  readonly onReadBack: (choice: string) => void
}

function Outcome({ view, onFill, onReadBack }: OutcomeProps) {
  if (view === NO_SCAN) return null
  const { fill } = view
  const readBack = (
    <div className="grid gap-2">
      <p className="font-semibold">The scanner may have left something out. Which of these is on the label?</p>
      <div className="flex flex-wrap gap-2">
        {view.readBack.map(({ value, words }) => (
          <Button key={value} type="button" size={48} onClick={() => onReadBack(value)}>
            {words}
          </Button>
        ))}
      </div>
    </div>
  )
  return (
    <ScanResult view={view} readBack={readBack}>
      {fill && view.stops && (
        <div>
          <Button type="button" size={48} onClick={() => onFill(fill)}>
            {fillWords(view)}
          </Button>
        </div>
      )}
      {fill && !view.stops && <p className="font-semibold text-done">Filled in below.</p>}
    </ScanResult>
  )
}

/** Not a field of the form around it: Enter looks the code up and charts nothing. */
function CodeField({ onRead }: { readonly onRead: (raw: string) => void }) {
  const [raw, setRaw] = useState('')
  return (
    <div className="flex flex-wrap items-end gap-2">
      <div className="min-w-0 flex-1 basis-64">
        <TextField
          id="scan-code"
          name=""
          label="Code"
          hint="As printed below it, with its brackets: (01)09521234543213(10)AB12"
          value={raw}
          autoComplete="off"
          onChange={event => setRaw(event.currentTarget.value)}
          onKeyDown={event => {
            if (event.key !== 'Enter') return
            event.preventDefault()
            onRead(raw)
          }}
        />
      </div>
      <Button type="button" size={48} onClick={() => onRead(raw)}>
        Look it up
      </Button>
    </div>
  )
}

function useScan(path: string) {
  const { data, submit, state } = useFetcher<ScanView>()
  const view = data ?? NO_SCAN
  const send = (source: ScanSource, code: string, readBack?: string) => {
    // A whole item begins anew: the next scan is of another one.
    const before = view.next !== null || readBack !== undefined ? view.codes : []
    const body = new FormData()
    body.set('for', path)
    for (const text of before) body.append('before', text)
    body.set('source', source)
    body.set('code', code)
    if (readBack !== undefined) body.set('readBack', readBack)
    void submit(body, { method: 'post', action: '/scan', defaultShouldRevalidate: false })
  }
  return { view, send, isBusy: state !== 'idle' }
}

function useFilledOnce(view: ScanView, onFill: (answers: Typed) => void) {
  const fill = useRef(onFill)
  useEffect(() => {
    fill.current = onFill
  })
  useEffect(() => {
    if (view.fill && !view.stops) fill.current(view.fill)
  }, [view])
}
