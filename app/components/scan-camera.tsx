import { useEffect, useRef, useState } from 'react'
import { Button } from './button.tsx'

interface ScanCameraProps {
  readonly onRead: (raw: string) => void
  readonly onClose: () => void
}

const PAUSE_MS = 120 // between two looks at the picture: quick enough to feel at once, slow enough for a phone

/** What the camera sees, until it sees a code. Says plainly why where there is no camera. */
export function ScanCamera({ onRead, onClose }: ScanCameraProps) {
  const video = useRef<HTMLVideoElement>(null)
  const read = useRef(onRead)
  const [problem, setProblem] = useState<string | null>(null)
  useEffect(() => {
    read.current = onRead
  })
  useEffect(() => {
    const ended = new AbortController()
    watch(video, raw => read.current(raw), ended.signal).catch((error: unknown) => {
      if (!ended.signal.aborted) setProblem(wordsFor(error))
    })
    return () => ended.abort()
  }, [])
  return (
    <div className="grid gap-2">
      {problem ? (
        <p role="alert" className="rounded-control border border-due bg-due-tint px-3 py-2">
          {problem}
        </p>
      ) : (
        <video
          ref={video}
          muted
          playsInline
          aria-label="What the camera sees"
          className="max-h-80 w-full max-w-xl rounded-card bg-sunk"
        />
      )}
      <div>
        <Button type="button" onClick={onClose}>
          Close the camera
        </Button>
      </div>
    </div>
  )
}

type VideoRef = { readonly current: HTMLVideoElement | null }

/** Looks at the picture until a code is in it. Frees the camera at the end, however that comes. */
async function watch(video: VideoRef, onRead: (raw: string) => void, ended: AbortSignal): Promise<void> {
  // Absent where the page did not come by https.
  if (!('mediaDevices' in navigator)) throw new DOMException('', 'NotSupportedError')
  const { codeIn } = await import('./barcode-reader.ts')
  const stream = await navigator.mediaDevices.getUserMedia({
    video: { facingMode: 'environment', width: { ideal: 1280 } },
  })
  const stop = () => {
    for (const track of stream.getTracks()) track.stop()
  }
  ended.addEventListener('abort', stop)
  try {
    const raw = await firstCode(stream, video.current, codeIn, ended)
    if (raw !== null) onRead(raw)
  } finally {
    stop()
  }
}

/** Null when it ended before there was one. */
async function firstCode(
  stream: MediaStream,
  screen: HTMLVideoElement | null,
  codeIn: (picture: ImageData) => Promise<string | null>,
  ended: AbortSignal,
): Promise<string | null> {
  if (ended.aborted || !screen) return null
  screen.srcObject = stream
  await screen.play()
  while (!ended.aborted) {
    const picture = pictureOf(screen)
    const raw = picture && (await codeIn(picture))
    if (raw) return ended.aborted ? null : raw
    await new Promise(resolve => setTimeout(resolve, PAUSE_MS))
  }
  return null
}

function pictureOf(video: HTMLVideoElement): ImageData | null {
  const { videoWidth, videoHeight } = video
  if (videoWidth === 0) return null
  const canvas = new OffscreenCanvas(videoWidth, videoHeight)
  const drawing = canvas.getContext('2d', { willReadFrequently: true })
  drawing?.drawImage(video, 0, 0)
  return drawing?.getImageData(0, 0, videoWidth, videoHeight) ?? null
}

const TYPE_IT = 'Use a scanner, or type what is printed below the code.'

const problems: Readonly<Record<string, string>> = {
  NotAllowedError: `The camera was not allowed. Allow it for this site in the browser, or do without. ${TYPE_IT}`,
  NotFoundError: `No camera was found. ${TYPE_IT}`,
  NotReadableError: `The camera is in use by another program. ${TYPE_IT}`,
  NotSupportedError: `This browser gives no camera to this page: the address has to begin with https. ${TYPE_IT}`,
}

function wordsFor(error: unknown): string {
  const name = error instanceof Error || error instanceof DOMException ? error.name : ''
  return problems[name] ?? `The camera could not be read. ${TYPE_IT}`
}
