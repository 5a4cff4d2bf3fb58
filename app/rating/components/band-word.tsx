import { type Band, bands, bandWords } from '../band'

const tones: Record<Band, string> = {
  first: 'font-semibold text-oxide',
  soon: 'font-semibold text-ochre',
  turn: 'font-medium',
  watch: 'text-stone',
}

/** An urgency as a word with its weight. */
export function BandWord({ band }: { band: Band }) {
  return <span className={tones[band]}>{bandWords[band]}</span>
}

/** An urgency, and what it could be when one unknown turns out badly. */
export function Urgency({ band, bandHigh, small }: { band: Band; bandHigh: Band; small?: boolean }) {
  const couldBe = bands.indexOf(bandHigh) < bands.indexOf(band)
  return (
    <>
      <BandWord band={band} />
      {couldBe && (
        <span className={small ? 'text-s text-stone' : ''}>
          {' '}
          <span className="text-stone">could be</span>{' '}
          {small ? bandWords[bandHigh] : <BandWord band={bandHigh} />}
        </span>
      )}
    </>
  )
}
