import { useState } from 'react'
import type { ScanView } from '#app/scanning/scan-view.ts'
import { Button } from './button.tsx'
import { useHydrated } from './hydrated.ts'
import { ScanCamera } from './scan-camera.tsx'
import { TextField } from './text-field.tsx'

interface SourcesProps {
  readonly view: ScanView
  readonly isBusy: boolean
  readonly onCamera: (raw: string) => void
}

/** The scanner needs nothing on the page; the camera opens; a code can be typed, without scripts too. */
export function ScanSources({ view, isBusy, onCamera }: SourcesProps) {
  const [isOpen, setOpen] = useState(false)
  const isHydrated = useHydrated()
  const read = (raw: string) => {
    setOpen(false)
    onCamera(raw)
  }
  return (
    <div className="grid gap-3">
      <TextField
        key={view.typed}
        id="code"
        name="code"
        label="Code"
        hint="Scan it, or type what is printed below it with its brackets: (01)09521234543213(10)AB12"
        errors={view.error ? [view.error] : undefined}
        defaultValue={view.typed}
        autoComplete="off"
      />
      <div className="flex flex-wrap gap-2">
        <Button variant="primary" size={48} aria-disabled={isBusy || undefined}>
          Look it up
        </Button>
        {isHydrated && (
          <Button type="button" size={48} onClick={() => setOpen(true)}>
            Use the camera
          </Button>
        )}
      </div>
      {isOpen && <ScanCamera onRead={read} onClose={() => setOpen(false)} />}
    </div>
  )
}
