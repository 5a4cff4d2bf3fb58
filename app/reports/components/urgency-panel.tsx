import { Link } from 'react-router'
import { Urgency } from '~/rating/components/band-word'
import { OverlapChart } from '~/rating/components/overlap-chart'
import { formatTwoDigits } from '~/rating/figures'
import { Caution } from '~/ui/caution'
import type { Judgement } from '../judgement'
import type { PointRecord } from '../point-record.server'

const hits: Record<Judgement['worst'], string> = {
  short: 'a short fall',
  long: 'a long fall',
  low: 'a low fall to the ground',
  ground: 'onto the ground',
}

/** For those who may see it: how urgent the point's worst open hazard is, why, and what to look at next. */
export function UrgencyPanel({ record, name }: { record: PointRecord; name: string }) {
  if (record.urgency?.judgement == null) return null
  const { hazardCode, judgement } = record.urgency
  return (
    <section aria-label="Urgency" className="mt-6">
      <h3 className="text-1">
        <Urgency band={judgement.band} bandHigh={judgement.bandHigh} />
      </h3>
      <UrgencyWords judgement={judgement} name={name} />
      <p className="mt-3">
        <Link to={`/hazards/${hazardCode}`}>Open this hazard</Link>
      </p>
    </section>
  )
}

/** The figure in words, load and strength over each other, what moves it most, and what to look at next. */
export function UrgencyWords({ judgement, name }: { judgement: Judgement; name: string }) {
  const spread = judgement.timesHigh / Math.max(judgement.timesLow, 1e-12)
  return (
    <>
      <p>
        {`How often this would let a climber fall if left alone, and what they would hit: about ${formatTwoDigits(judgement.times)} times a usual one of its kind, ${hits[judgement.worst]}.`}
        {spread > 1.5 &&
          ` Not sure yet: between ${formatTwoDigits(judgement.timesLow)} and ${formatTwoDigits(judgement.timesHigh)} times.`}
      </p>
      {judgement.deciding !== 'cuts_rope' &&
        judgement.deciding !== 'releases_rope' &&
        judgement.load !== null &&
        judgement.strength.length > 0 && (
          <OverlapChart
            load={judgement.load}
            strength={judgement.strength}
            loadWords={`load on ${name.toLowerCase()}`}
          />
        )}
      <table className="ruled mt-2">
        <thead>
          <tr>
            <th scope="col">What moves it most</th>
            <th scope="col" className="text-right">
              <span className="sr-only">How many times between its ends</span>
            </th>
          </tr>
        </thead>
        <tbody>
          {judgement.reasons.map(reason => (
            <tr key={reason.name}>
              <td>{reason.words}</td>
              <td className="text-right">{`× ${formatTwoDigits(reason.times)}`}</td>
            </tr>
          ))}
        </tbody>
      </table>
      {judgement.floors.map(floor => (
        <p key={floor} className="mt-2">
          {`At least In turn: ${floor}.`}
        </p>
      ))}
      {judgement.lookNext !== null && (
        <p className="mt-3">
          <b className="font-medium">Look next:</b> {judgement.lookNext}
        </p>
      )}
      <Caution>
        Worked out from what was seen; nothing here certifies fixed gear. Inspect, judge and back up for
        yourself.
      </Caution>
    </>
  )
}
