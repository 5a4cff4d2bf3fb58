/** The mark of the house: an eye bolt seen from the side in solid rock, a bite worn out of its eye. */
export function EyeBolt({ size }: { size: number }) {
  return (
    <svg width={size} height={size} viewBox="0 0 24 24" aria-hidden="true" className="flex-none">
      <path
        d="M14.5 0L13.3 4 15 8.5 13.6 12.5 15.2 17 13.8 20.5 14.8 24H24V0Z"
        fill="var(--stone)"
        opacity=".38"
      />
      <path d="M10 12H21" stroke="var(--slate)" strokeWidth="3.4" />
      <path
        d="M10.2 8.8A5 5 0 1 0 10.2 15.2M10.2 8.8A5 5 0 0 1 11.4 12A5 5 0 0 1 10.2 15.2"
        fill="none"
        stroke="var(--slate)"
        strokeWidth="3"
      />
      <circle cx="6" cy="19" r="2.9" fill="var(--sheet)" />
      <path d="M3.3 17.3A5.9 5.9 0 0 0 9 17.2" fill="none" stroke="var(--oxide)" strokeWidth="1.5" />
    </svg>
  )
}
