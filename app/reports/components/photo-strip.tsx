interface Shown {
  storageKey: string
  width: number
  height: number
  credit: string | null
}

/** Photos in a row, each in the space it will take, opened larger by a click. */
export function PhotoStrip({ photos, label = 'Photos' }: { photos: Shown[]; label?: string }) {
  if (photos.length === 0) return null
  return (
    <section aria-label={label} className="mt-5">
      <ul className="flex flex-wrap gap-2.5">
        {photos.map((photo, index) => (
          <li key={photo.storageKey}>
            <a href={`/photos/${photo.storageKey}/960.webp`}>
              <img
                src={`/photos/${photo.storageKey}/320.webp`}
                alt={`${label}, ${index + 1} of ${photos.length}`}
                width={160}
                height={120}
                loading="lazy"
                className="h-30 w-40 rounded-[3px] border border-rule object-cover"
              />
            </a>
            {photo.credit && <span className="text-s text-stone">{photo.credit}</span>}
          </li>
        ))}
      </ul>
    </section>
  )
}
