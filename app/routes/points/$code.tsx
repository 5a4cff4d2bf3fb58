import { Link, redirect } from 'react-router'
import { anchorKindWords } from '~/crags/anchor'
import { findAnchor } from '~/crags/anchors.server'
import { requireCragSubject } from '~/crags/crags.server'
import { formatPart } from '~/crags/part'
import { formatFitted } from '~/crags/part-words'
import { formatCode, parseCode, toSlug } from '~/lib/code'
import { NoticeBands } from '~/notices/components/notice-bands'
import { noticesInForce } from '~/notices/notices.server'
import { viewerContext } from '~/people/viewer-context'
import { listActivities } from '~/record/activities.server'
import { formatActivity } from '~/reports/activity-words'
import { PhotoStrip } from '~/reports/components/photo-strip'
import { PointPanel } from '~/reports/components/point-panel'
import { UrgencyPanel } from '~/reports/components/urgency-panel'
import { formatFinding } from '~/reports/finding-words'
import { hazardStateWords } from '~/reports/hazard'
import { readPoint } from '~/reports/point-record.server'
import { howSeenWords } from '~/reports/report'
import { ButtonLink } from '~/ui/button'
import { Page } from '~/ui/page'
import { formatDay, formatMoment, formatZone } from '~/ui/when'
import { clockContext, databaseContext } from '~/web/context'
import { notFound } from '~/web/responses'
import type { Route } from './+types/$code'

export const meta: Route.MetaFunction = ({ loaderData }) => [
  {
    title: `${loaderData?.name ?? 'Fixed point'} ${loaderData ? formatCode(loaderData.point.code) : ''} · Cragfettle`,
  },
  { name: 'description', content: 'One fixed point: its parts, what was found on it, and its history.' },
]

export async function loader({ params, context }: Route.LoaderArgs) {
  const db = context.get(databaseContext)
  const viewer = context.get(viewerContext)
  const now = context.get(clockContext)()
  const code = parseCode(params.code)
  const point = code === null ? null : await findAnchor(db, viewer, code)
  if (point === null) throw notFound('No fixed point carries this code. Check it: codes look like KC-7FQ2X.')
  if (params.code !== point.code) throw redirect(`/points/${point.code}`, 301)
  const subject = await requireCragSubject(db, point.cragId)
  const record = await readPoint(db, viewer, point.id, subject)
  const [first] = point.climbs
  return {
    point,
    name: first?.position ?? anchorKindWords[point.kind],
    record,
    notices: await noticesInForce(db, viewer, { now, anchorIds: [point.id] }),
    history: (
      await listActivities(db, [point.id, ...record.hazards.map(hazard => hazard.id)], { publicOnly: true })
    ).map(line => ({
      id: line.id,
      at: line.at,
      words: formatActivity(line),
    })),
  }
}

export default function Point({ loaderData }: Route.ComponentProps) {
  const { point, name, record, notices, history } = loaderData
  const removed = record.parts.filter(part => part.removedOn !== null)
  const shared = point.climbs.map(climb => climb.name).join(', ')
  return (
    <Page
      title={name}
      lead={`${formatCode(point.code)}, ${shared}`}
      crumbs={[
        { label: point.areaName, to: '/crags' },
        { label: point.cragName, to: `/crags/${toSlug(point.cragName, point.cragCode)}` },
        ...point.climbs.slice(0, 2).map(climb => ({
          label: climb.name,
          to: `/climbs/${toSlug(climb.name, climb.code)}?point=${point.code}`,
        })),
      ]}
    >
      <NoticeBands notices={notices} timeZone={point.timeZone} />
      <div className="mt-6 grid gap-x-11 gap-y-8 md:grid-cols-2">
        <div>
          <PointPanel point={{ ...point, name, sharedBy: shared }} record={record} />
          {point.lapsesOn && (
            <p className="mt-2 text-s text-stone">{`“No fault seen” lapses on ${formatDay(point.lapsesOn)}.`}</p>
          )}
          <UrgencyPanel record={record} name={name} />
          <PhotoStrip photos={record.photos} />
          {point.climbs[0] && (
            <p className="mt-5">
              <ButtonLink to={`/report/${point.climbs[0].code}/${point.code}`} kind="quiet">
                Report something here
              </ButtonLink>
            </p>
          )}
        </div>
        <div>
          <h2 className="text-1 font-semibold">What was found</h2>
          <ul className="mt-2 border-t border-slate">
            {record.seen.map(look => (
              <li key={look.id} className="border-b border-rule py-3">
                {look.findings.map(finding => formatFinding(finding)).join('; ')}
                {look.findings.some(finding => finding.clearedAt !== null) && ' (mended since)'}
                <br />
                <span className="text-s text-stone">
                  {`${formatDay(look.seenOn)}, ${howSeenWords[look.howSeen]}${look.isCheck ? ', a check' : ''}`}
                </span>
              </li>
            ))}
            {record.seen.length === 0 && (
              <li className="border-b border-rule py-3 text-stone">
                Nobody has looked here yet. Checks and reports stand here once they are on record.
              </li>
            )}
          </ul>
          {record.hazards.length > 0 && (
            <>
              <h2 className="mt-8 text-1 font-semibold">Hazards</h2>
              <ul className="mt-2 border-t border-slate">
                {record.hazards.map(hazard => (
                  <li key={hazard.code} className="border-b border-rule py-3">
                    {hazard.band === null ? (
                      hazard.headline
                    ) : (
                      <Link to={`/hazards/${hazard.code}`}>{hazard.headline}</Link>
                    )}
                    <br />
                    <span className="text-s text-stone">
                      {`${hazardStateWords[hazard.state]}, since ${formatMoment(hazard.openedAt, point.timeZone)}`}
                    </span>
                  </li>
                ))}
              </ul>
            </>
          )}
          {removed.length > 0 && (
            <>
              <h2 className="mt-8 text-1 font-semibold">Taken out</h2>
              <ul className="mt-2 border-t border-slate">
                {removed.map(part => (
                  <li key={part.id} className="border-b border-rule py-3">
                    {formatPart(part)}
                    <br />
                    <span className="text-s text-stone">
                      {`fitted ${formatFitted(part, formatDay)}, taken out ${formatDay(part.removedOn!)}`}
                    </span>
                  </li>
                ))}
              </ul>
            </>
          )}
          <h2 className="mt-8 text-1 font-semibold">History</h2>
          <ul className="mt-2 border-t border-slate">
            {history.map(line => (
              <li key={line.id} className="flex gap-4 border-b border-rule py-2">
                <span className="w-40 shrink-0 text-stone">{formatMoment(line.at, point.timeZone)}</span>
                <span>{line.words}</span>
              </li>
            ))}
            {history.length === 0 && <li className="border-b border-rule py-2 text-stone">Nothing yet.</li>}
          </ul>
          <p className="mt-2 text-s text-stone">{`Times are ${formatZone(point.timeZone)}.`}</p>
        </div>
      </div>
    </Page>
  )
}
