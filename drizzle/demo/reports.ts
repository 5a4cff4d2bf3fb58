import type { Database } from '../../app/db/client.server'
import type { EdgeClass, FindingKind } from '../../app/rating/finding'
import { putOnRecord, takeIn } from '../../app/reports/decide.server'
import { stagePhotos } from '../../app/reports/photos.server'
import { sendReport } from '../../app/reports/send.server'
import type { DemoAct } from './act'
import { type Drawing, drawPhoto } from './drawings'
import type { DemoPeople } from './people'
import type { DemoClimb, DemoPlaces } from './places'

interface DemoReport {
  climb: string
  /** bolt number, or the lower-off */
  at: number | 'lower-off'
  part?: string
  kind: FindingKind
  low?: number
  high?: number
  unit?: 'mm' | 'grade'
  edge?: EdgeClass
  daysAgo: number
  by: string
  words: string
  photo?: Drawing
  outcome: 'new' | 'taken_in' | 'on_record'
}

/** What climbers have told lately; the worn ring of Slack Water is still to be reported. */
const told: DemoReport[] = [
  {
    climb: 'Slack Water',
    at: 3,
    part: 'wedge_bolt',
    kind: 'nut_loose',
    daysAgo: 9,
    by: 'pia',
    words: 'The nut turns with two fingers. The stud itself did not move.',
    outcome: 'taken_in',
  },
  {
    climb: 'Slack Water',
    at: 4,
    part: 'bonded_eye',
    kind: 'rust',
    low: 3,
    high: 3,
    unit: 'grade',
    daysAgo: 30,
    by: 'joss',
    words: 'A stain below the eye, rubs off.',
    outcome: 'on_record',
  },
  {
    climb: 'Bilge',
    at: 5,
    part: 'fixed_draw',
    kind: 'groove',
    low: 1,
    high: 2,
    unit: 'mm',
    edge: 'felt',
    daysAgo: 14,
    by: 'pia',
    words: 'The top connector of the draw is worn and catches a fingernail.',
    photo: 'groove',
    outcome: 'taken_in',
  },
  {
    climb: 'Haar',
    at: 'lower-off',
    part: 'chain',
    kind: 'rust',
    low: 2,
    high: 2,
    unit: 'grade',
    daysAgo: 21,
    by: 'pia',
    words: 'Brown spots on the chain, more on the left leg.',
    photo: 'rust',
    outcome: 'taken_in',
  },
  {
    climb: 'Cold Front',
    at: 2,
    part: 'bonded_eye',
    kind: 'turns_by_hand',
    daysAgo: 4,
    by: 'pia',
    words: 'The whole bolt turns a few degrees by hand. I came down from the one above.',
    photo: 'eye',
    outcome: 'taken_in',
  },
  {
    climb: 'Trolley Way',
    at: 3,
    part: 'bonded_eye',
    kind: 'rust',
    low: 2,
    high: 2,
    unit: 'grade',
    daysAgo: 6,
    by: 'wyn',
    words: 'A few spots only.',
    outcome: 'on_record',
  },
  {
    climb: 'Powder Monkey',
    at: 6,
    part: 'bonded_eye',
    kind: 'resin_gap',
    daysAgo: 1,
    by: 'pia',
    words: 'There is a gap between resin and rock on the upper side, a fingernail goes in.',
    outcome: 'new',
  },
]

const links = { appUrl: 'http://127.0.0.1', toStatusSecret: (reportId: string) => reportId }

/** Reports of the last weeks, sent and decided as people would. */
export async function seedReports(
  db: Database,
  at: DemoAct,
  people: DemoPeople,
  places: DemoPlaces,
  photoDir: string,
): Promise<void> {
  for (const [index, report] of told.entries()) {
    const climb = places.get(report.climb)!
    const point = report.at === 'lower-off' ? climb.lowerOff : climb.bolts[report.at - 1]!
    const reporter = people.person[report.by]!
    const act = at(-report.daysAgo, { personId: reporter.id })
    const stagedBy = `demo-${index}`
    const photoKeys: string[] = []
    if (report.photo !== undefined) {
      const taken = await drawPhoto(photoDir, report.photo)
      await stagePhotos(db, act, stagedBy, [taken])
      photoKeys.push(taken.key)
    }
    const { reportId } = await sendReport(db, {
      act,
      links,
      clientKey: `demo-report-${String(index).padStart(8, '0')}`,
      cragId: climb.cragId,
      climbId: climb.id,
      anchorId: point.id,
      place: toPlace(report, climb),
      seenOn: act.now.toISOString().slice(0, 10),
      howSeen: 'on_it',
      words: report.words,
      findings: [
        {
          kind: report.kind,
          partId: point.parts.find(part => part.kind === report.part)?.id ?? null,
          unit: report.unit ?? null,
          low: report.low ?? null,
          high: report.high ?? null,
          method: report.unit === undefined ? null : 'by_eye',
          edge: report.edge ?? null,
          triedByHand: true,
        },
      ],
      photoKeys,
      stagedBy,
      person: reporter,
      guestEmail: null,
    })
    const coordinator = climb.cragName === 'Gannet Wall' ? people.person.ines! : people.person.bram!
    const decided = { reportId, act: at(-report.daysAgo + 0.5, { personId: coordinator.id }), links }
    const done =
      report.outcome === 'taken_in'
        ? await takeIn(db, { ...decided, publicPhotoKeys: photoKeys })
        : report.outcome === 'on_record'
          ? await putOnRecord(db, decided)
          : { ok: true as const }
    if (!done.ok) throw new Error(`${report.climb}: ${done.reason}`)
  }
}

function toPlace(report: DemoReport, climb: DemoClimb): string {
  const position = report.at === 'lower-off' ? 'lower-off' : `bolt ${report.at}`
  return `the ${position} on ${climb.name}, ${climb.cragName}`
}
