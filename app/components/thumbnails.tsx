import { Link } from 'react-router'

interface ThumbnailsProps {
  readonly ids: readonly string[]
  /** Of what, when: the words before the number in each one's description. */
  readonly of: string
  /** Of an entry that no longer counts: shown crossed out. */
  readonly struck?: boolean
  /** Where they are seen beside those of another day. */
  readonly compareHref?: string
}

/** Photographs of an entry, small, each a link to the whole picture. */
export function Thumbnails({ ids, of, struck = false, compareHref }: ThumbnailsProps) {
  if (ids.length === 0) return null
  return (
    <ul className="mt-1.5 flex flex-wrap gap-2">
      {ids.map((id, index) => (
        <li key={id}>
          <a href={`/photographs/${id}`} className="relative block">
            <img
              src={`/photographs/${id}?size=small`}
              alt={`Photograph ${index + 1} of ${of}${struck ? ', no longer counts' : ''}`}
              loading="lazy"
              className={`size-20 rounded-control border border-line object-cover ${struck ? 'opacity-60' : ''}`}
            />
            {struck && (
              <svg aria-hidden="true" viewBox="0 0 10 10" className="absolute inset-0 size-full stroke-late">
                <path d="M0 0L10 10M10 0L0 10" />
              </svg>
            )}
          </a>
        </li>
      ))}
      {compareHref && (
        <li>
          <Link to={compareHref} className="inline-flex min-h-11 items-center font-semibold underline">
            Compare with another day
          </Link>
        </li>
      )}
    </ul>
  )
}
