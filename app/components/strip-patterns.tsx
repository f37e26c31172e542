export const HATCH = 'url(#strip-late)'
export const TRIANGLE = '#strip-triangle'
export const NOTE = '#strip-note'

/** What the strips of a page share, drawn once: place it before the first strip. */
export function StripPatterns() {
  return (
    <svg width="0" height="0" aria-hidden="true" className="absolute">
      <defs>
        <pattern id="strip-late" width="6" height="6" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
          <rect width="6" height="6" className="fill-late-tint" />
          <rect width="2.6" height="6" className="fill-late" />
        </pattern>
        <g id="strip-triangle">
          <path d="M0-5.5L5.5 4.5h-11z" className="fill-surface stroke-late stroke-2" strokeLinejoin="round" />
        </g>
        <g id="strip-note">
          <path
            d="M-3.5-5h4.5l2.5 2.5V5h-7z"
            className="fill-surface stroke-ink2 stroke-[1.5]"
            strokeLinejoin="round"
          />
          <path d="M-1.5.5h3M-1.5 2.7h3" className="fill-none stroke-ink2" />
        </g>
      </defs>
    </svg>
  )
}
