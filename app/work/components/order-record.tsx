import { formatPart, type Material, type PartKind } from '~/crags/part'
import { PhotoStrip } from '~/reports/components/photo-strip'
import { formatDay, formatMoment } from '~/ui/when'
import type { CheckerKind, CheckMethod } from '../order'
import { checkerWords, checkMethodWords } from '../words'
import { Fact } from './job-facts'

interface Check {
  name: string
  whoKind: CheckerKind
  how: CheckMethod
  outcome: 'good' | 'returned'
  words: string | null
  at: Date
}

interface Recorded {
  name: string
  doneOn: string
  minutes: number | null
  words: string | null
  noPhotoReason: string | null
  fitted: {
    kind: PartKind | null
    material: Material | null
    sizeMm: number | null
    marking: string | null
  }[]
  checks: Check[]
}

/** What was done for an order, and what those who checked it saw. */
export function OrderRecord(props: {
  record: Recorded
  photos: { storageKey: string; width: number; height: number }[]
  timeZone: string
}) {
  const { record, photos, timeZone } = props
  const { doneOn, name, minutes, words, noPhotoReason, checks } = record
  const fitted = record.fitted.flatMap(formatFitted)
  return (
    <section className="mt-8" aria-labelledby="record">
      <h2 id="record" className="text-1 font-semibold">
        What was done
      </h2>
      <dl className="mt-2 border-b border-rule">
        <Fact word="Done">
          {[formatDay(doneOn), name, minutes && `${minutes} min`].filter(Boolean).join(', ')}
        </Fact>
        <Fact word="Fitted">
          {fitted.length === 0
            ? 'nothing'
            : // biome-ignore lint/suspicious/noArrayIndexKey: two parts may read the same
              fitted.map((line, index) => <div key={index}>{line}</div>)}
        </Fact>
        {words && <Fact word="Words">{words}</Fact>}
        {noPhotoReason && <Fact word="No photo">{noPhotoReason}</Fact>}
        {checks.map(check => (
          <Fact key={check.at.getTime()} word="Checked">
            {`${check.outcome === 'good' ? 'in order' : 'returned'}, ${checkMethodWords[check.how]}, ${check.name} (${checkerWords[check.whoKind]}), ${formatMoment(check.at, timeZone)}`}
            {check.words && <div>{check.words}</div>}
          </Fact>
        ))}
      </dl>
      <PhotoStrip photos={photos.map(photo => ({ ...photo, credit: null }))} label="The work" />
    </section>
  )
}

function formatFitted({ kind, material, sizeMm, marking }: Recorded['fitted'][number]): string[] {
  if (kind === null) return []
  const part = formatPart({ kind, material: material ?? 'unknown', sizeMm })
  return [marking === null ? part : `${part}, stamped ${marking}`]
}
