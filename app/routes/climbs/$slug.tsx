import { redirect, useSearchParams } from 'react-router'
import { listClimbsOf } from '~/crags/anchors.server'
import { findClimb } from '~/crags/climbs.server'
import { Line } from '~/crags/components/line'
import { trafficWords } from '~/crags/crag'
import { requireCragSubject } from '~/crags/crags.server'
import { formatGearShort } from '~/crags/part-words'
import { formatGear } from '~/crags/place-words'
import { parseCode, parseSlug, toSlug } from '~/lib/code'
import { toDay } from '~/lib/dates'
import { NoticeBands } from '~/notices/components/notice-bands'
import { noticesInForce } from '~/notices/notices.server'
import { viewerContext } from '~/people/viewer-context'
import { PointPanel } from '~/reports/components/point-panel'
import { UrgencyPanel } from '~/reports/components/urgency-panel'
import { toDrawnPoint, toZones } from '~/reports/drawn-line'
import { readPoint } from '~/reports/point-record.server'
import { listPointWords } from '~/reports/point-words.server'
import { ButtonLink } from '~/ui/button'
import { Page } from '~/ui/page'
import { clockContext, databaseContext } from '~/web/context'
import { notFound } from '~/web/responses'
import type { Route } from './+types/$slug'

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${loaderData?.climb.name ?? 'Route'}, ${loaderData?.climb.cragName ?? ''} · Cragfettle` },
  {
    name: 'description',
    content: `The fixed gear of ${loaderData?.climb.name}, bolt by bolt, and what is known of it.`,
  },
]

export async function loader({ params, request, context }: Route.LoaderArgs) {
  const db = context.get(databaseContext)
  const viewer = context.get(viewerContext)
  const now = context.get(clockContext)()
  const code = parseSlug(params.slug)
  const climb = code === null ? null : await findClimb(db, viewer, code, toDay(now, 'UTC'))
  if (climb === null) throw notFound('No route is known by this address. Look it up by name or tag code.')
  const address = `/climbs/${toSlug(climb.name, climb.code)}`
  if (params.slug !== toSlug(climb.name, climb.code)) throw redirect(address, 301)
  const asked = parseCode(new URL(request.url).searchParams.get('point') ?? '')
  const point = climb.points.find(one => one.code === asked) ?? toWorst(climb.points)
  const subject = await requireCragSubject(db, climb.cragId)
  const words = await listPointWords(
    db,
    climb.points.map(one => one.anchorId),
  )
  return {
    climb,
    points: climb.points.map(one => toDrawnPoint(one, words.get(one.anchorId) ?? formatGearShort(one.parts))),
    zones: toZones(climb),
    notices: await noticesInForce(db, viewer, { now, climbId: climb.id }),
    shown:
      point === undefined
        ? null
        : {
            point: { ...point, sharedBy: await nameSharing(db, point.anchorId, climb.code, climb.name) },
            record: await readPoint(db, viewer, point.anchorId, subject),
          },
  }
}

const order = ['severe', 'poor', 'fair', 'unknown', 'good'] as const

/** What the page opens on: the worst point, the lowest of equals. */
function toWorst<P extends { state: (typeof order)[number] }>(points: P[]): P | undefined {
  return order.flatMap(state => points.filter(point => point.state === state))[0]
}

async function nameSharing(
  db: Parameters<typeof listClimbsOf>[0],
  anchorId: string,
  code: string,
  name: string,
) {
  const others = (await listClimbsOf(db, anchorId)).filter(climb => climb.code !== code)
  return others.length === 0 ? `${name} only` : `also on ${others.map(climb => climb.name).join(', ')}`
}

export default function Climb({ loaderData }: Route.ComponentProps) {
  const { climb, points, zones, notices, shown } = loaderData
  const [search] = useSearchParams()
  const length = `${climb.lengthM} m, ${formatGear(climb.points.map(point => point.kind))}, ${trafficWords[climb.traffic]}`
  return (
    <Page
      title={climb.name}
      lead={[length, climb.grade].filter(Boolean).join(', ')}
      crumbs={[
        { label: climb.areaName, to: '/crags' },
        { label: climb.cragName, to: `/crags/${toSlug(climb.cragName, climb.cragCode)}` },
        { label: climb.sectorName },
      ]}
    >
      <NoticeBands notices={notices} timeZone={climb.timeZone} />
      <div className="route-columns">
        <div>
          <Line
            lengthM={climb.lengthM}
            points={points}
            zones={zones}
            ledges={climb.ledges}
            ground={climb.points[0]?.below ?? 'ground'}
            selected={shown?.point.code}
            href={code => `?point=${code}#point`}
          />
          <p className="mt-5">
            <ButtonLink to={`/report/${climb.code}`} kind="quiet">
              Report something on this route
            </ButtonLink>
          </p>
        </div>
        {shown !== null && (
          <div key={search.get('point')}>
            <PointPanel point={shown.point} record={shown.record} />
            <UrgencyPanel record={shown.record} name={shown.point.name} />
          </div>
        )}
      </div>
    </Page>
  )
}
