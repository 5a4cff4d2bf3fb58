import { Link, redirect } from 'react-router'
import { listClimbs } from '~/crags/climbs.server'
import { ConditionMark } from '~/crags/components/condition-mark'
import { Strip } from '~/crags/components/strip'
import { conditionShort } from '~/crags/condition-state'
import { trafficWords } from '~/crags/crag'
import { findConsent, findCrag, requireCragSubject } from '~/crags/crags.server'
import { listNearby } from '~/crags/nearby.server'
import { formatGear, formatOpen, formatWorst } from '~/crags/place-words'
import { parseSlug, toSlug } from '~/lib/code'
import { toDay } from '~/lib/dates'
import { groupBy } from '~/lib/group-by'
import { NoticeBands } from '~/notices/components/notice-bands'
import { noticesInForce } from '~/notices/notices.server'
import { can } from '~/people/viewer'
import { viewerContext } from '~/people/viewer-context'
import { ButtonLink } from '~/ui/button'
import { Page } from '~/ui/page'
import { clockContext, databaseContext } from '~/web/context'
import { notFound } from '~/web/responses'
import type { Route } from './+types/$slug'

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${loaderData?.crag.name ?? 'Crag'} · Cragfettle` },
  { name: 'description', content: `Fixed gear at ${loaderData?.crag.name}: routes, conditions, notices.` },
]

export async function loader({ params, context }: Route.LoaderArgs) {
  const db = context.get(databaseContext)
  const viewer = context.get(viewerContext)
  const now = context.get(clockContext)()
  const code = parseSlug(params.slug)
  const crag = code === null ? null : await findCrag(db, viewer, code)
  if (crag === null) throw notFound('No crag is known by this address. Look it up by name or tag code.')
  if (params.slug !== toSlug(crag.name, crag.code))
    throw redirect(`/crags/${toSlug(crag.name, crag.code)}`, 301)
  const climbs = await listClimbs(db, viewer, crag.id, toDay(now, crag.timeZone))
  return {
    crag,
    consent: crag.consent,
    // what an owner asks is for those who work there
    conditions: can(viewer, 'order:see', await requireCragSubject(db, crag.id))
      ? ((await findConsent(db, crag.id))?.conditions ?? null)
      : null,
    nearby: await listNearby(db, viewer, crag),
    notices: await noticesInForce(db, viewer, { now, cragId: crag.id }),
    sectors: [...groupBy(climbs, climb => climb.sectorName)].map(([name, list]) => ({ name, climbs: list })),
  }
}

const consentWords = {
  given: 'The owner has given consent to work on fixed gear.',
  not_needed: 'No consent is needed for work on fixed gear.',
  disputed: 'Consent to work on fixed gear is disputed: no work is offered here.',
  unknown: 'Whether the owner consents to work on fixed gear is not known.',
}

export default function Crag({ loaderData }: Route.ComponentProps) {
  const { crag, consent, conditions, nearby, notices, sectors } = loaderData
  return (
    <Page
      title={crag.name}
      crumbs={[{ label: crag.areaName, to: '/crags' }]}
      lead={`${formatWorst(crag.counts)}, ${formatOpen(crag)}`}
    >
      <NoticeBands notices={notices} timeZone={crag.timeZone} />
      <div className="mt-6 grid gap-x-11 gap-y-6 md:grid-cols-[1fr_20rem]">
        <div>
          {sectors.map(sector => (
            <section key={sector.name} className="mb-8">
              <h2 className="text-2 font-semibold">{sector.name}</h2>
              <ul className="mt-3 border-b border-rule">
                {sector.climbs.map(climb => (
                  <ClimbRow key={climb.code} climb={climb} />
                ))}
              </ul>
            </section>
          ))}
          {sectors.length === 0 && <p className="text-stone">No route is on record here yet.</p>}
        </div>
        <aside className="text-s text-stone">
          <h2 className="text-1 font-semibold text-slate">About this crag</h2>
          <p className="mt-2">
            {[crag.rock, crag.aspect && `faces ${crag.aspect}`].filter(Boolean).join(', ')}
          </p>
          {crag.approach && <p className="mt-2">{crag.approach}</p>}
          {crag.policy && <p className="mt-2">{crag.policy}</p>}
          <p className="mt-2">{[consentWords[consent], conditions].filter(Boolean).join(' ')}</p>
          {crag.warmSea && (
            <p className="mt-2">
              Stainless steel by a warm sea may crack unseen and fail under body weight; no look and no pull
              test shows it. Such a point stands as “Not looked at”, whatever was seen.
            </p>
          )}
          <ul className="mt-4 border-t border-rule">
            {crag.organisations.map(held => (
              <li key={held.organisationId + held.remit} className="border-b border-rule py-2">
                {`${held.name} looks after ${held.remit === 'access' ? 'access' : 'fixed gear'}`}
              </li>
            ))}
          </ul>
          {nearby.length > 0 && (
            <>
              <h2 className="mt-6 text-1 font-semibold text-slate">Near here</h2>
              <ul className="mt-2 border-t border-rule">
                {nearby.map(other => (
                  <li key={other.code} className="flex items-center gap-3 border-b border-rule py-2">
                    <ConditionMark state={other.worstState} size={14} decorative />
                    <Link to={`/crags/${toSlug(other.name, other.code)}`} className="plain-link grow">
                      {other.name}
                    </Link>
                    <span>{`${other.km.toFixed(1)} km`}</span>
                  </li>
                ))}
              </ul>
            </>
          )}
          <p className="mt-4">
            <ButtonLink to={`/report?crag=${crag.code}`} kind="quiet">
              Report fixed gear here
            </ButtonLink>
          </p>
        </aside>
      </div>
    </Page>
  )
}

type Climb = Route.ComponentProps['loaderData']['sectors'][number]['climbs'][number]

function ClimbRow({ climb }: { climb: Climb }) {
  return (
    <li className="climb-line">
      <ConditionMark state={climb.worstState} size={16} decorative />
      <span>
        <Link to={`/climbs/${toSlug(climb.name, climb.code)}`} className="font-medium">
          {climb.name}
        </Link>{' '}
        <span className="text-s text-stone">
          {`${climb.lengthM} m, ${formatGear(climb.points.map(point => point.kind))}, ${trafficWords[climb.traffic]}`}
        </span>
      </span>
      <Strip
        points={climb.points.map(point => ({ along: point.alongM / climb.lengthM, state: point.state }))}
      />
      <span
        className={
          climb.worstState === 'severe'
            ? 'text-oxide'
            : climb.worstState === 'poor'
              ? 'text-ochre'
              : 'text-stone'
        }
      >
        {conditionShort[climb.worstState]}
      </span>
    </li>
  )
}
