import { Link } from 'react-router'
import { ConditionMark } from '~/crags/components/condition-mark'
import { conditionWords } from '~/crags/condition-state'
import { caution } from '~/lib/caution'
import { bands } from '~/rating/band'
import { BandWord } from '~/rating/components/band-word'
import { Page } from '~/ui/page'
import type { Route } from './+types/about'

export const meta: Route.MetaFunction = () => [
  { title: 'About the record · Cragfettle' },
  {
    name: 'description',
    content: 'What this record is and is not, how urgency comes about, and who sees what.',
  },
]

const shown = ['good', 'fair', 'poor', 'severe', 'unknown'] as const
const means = {
  good: 'Somebody trained looked and saw no fault, on a day that is said. It lapses after two years, by the sea after one.',
  fair: 'A fault that needs no work yet.',
  poor: 'Something is wrong. Look for yourself before you trust it.',
  severe: 'Expect it to fail.',
  unknown: 'Nobody trained has looked, or too long ago, or nothing that can be seen would tell.',
}
const urgency = {
  first: 'The next free hands go here.',
  soon: 'Within the season.',
  turn: 'When somebody is there anyway, before it gets worse.',
  watch: 'No work; look again.',
}

export default function About() {
  return (
    <Page title="About the record">
      <div className="mt-6 grid max-w-[68ch] gap-8">
        <p className="border-l-3 border-ochre pl-4 text-1">{caution}</p>
        <section>
          <h2 className="text-2 font-semibold">What the marks mean</h2>
          <ul className="mt-3 border-b border-rule">
            {shown.map(state => (
              <li
                key={state}
                className="grid grid-cols-[26px_1fr] gap-x-3 border-t border-rule py-3 md:grid-cols-[26px_15rem_1fr]"
              >
                <ConditionMark state={state} size={20} decorative />
                <b className="font-medium">{conditionWords[state]}</b>
                <span className="col-start-2 text-stone md:col-start-3">{means[state]}</span>
              </li>
            ))}
          </ul>
          <p className="mt-3">
            A climber’s report can make a condition worse, never better. Only a trained person’s check, or
            work that has been done and checked by somebody else, makes it better.
          </p>
        </section>
        <section>
          <h2 className="text-2 font-semibold">How urgency comes about</h2>
          <p className="mt-2">
            For every hazard we work out how often it would let a climber fall if it were left alone, and what
            they would hit: the loads that climbing puts on it against the strength that is left, how much the
            route is climbed, and how far up the line it stands. What nobody knows is not taken as fair; it
            widens the range, and the page says what measurement would settle it. Coordinators see the reasons
            and decide the order of work.
          </p>
          <ul className="mt-3 border-b border-rule">
            {bands.map(band => (
              <li key={band} className="grid grid-cols-[9rem_1fr] gap-3 border-t border-rule py-3">
                <BandWord band={band} />
                <span className="text-stone">{urgency[band]}</span>
              </li>
            ))}
          </ul>
          <p className="mt-3">
            Roofs and outward pull, how long something has already lasted, and moving rock are not in it.
          </p>
        </section>
        <section>
          <h2 className="text-2 font-semibold">Who sees what</h2>
          <p className="mt-2">
            Everybody sees places, conditions, notices and what was mended, with the organisation and the day.
            Coordinators and access officers of the crag also see urgency, its reasons and its range.
          </p>
          <p className="mt-3">
            Nobody in public sees who reported, fitted or checked. Who reported, and their address, is seen
            only by coordinators and access officers of the organisations that lead at the crag, to ask back.
            Words of a report are public only after a coordinator has looked.
          </p>
        </section>
        <section>
          <h2 className="text-2 font-semibold">Photos</h2>
          <p className="mt-2">
            A photo stays its owner’s. Who sends one lets the organisation use it in the record, in notices
            and on posters. It is public only after a coordinator has looked. The place a camera writes into
            it is thrown away when it comes in.
          </p>
        </section>
        <section>
          <h2 className="text-2 font-semibold">Notices</h2>
          <p className="mt-2">
            A notice says what not to rely on or where not to climb, whose decision that is and when it is
            looked at again. A first warning goes out before an access officer has reviewed it and says so.
            Notices are kept for what is to be mended first or soon: that there is none says nothing about any
            fixed gear.
          </p>
        </section>
        <section>
          <h2 className="text-2 font-semibold">Reporting</h2>
          <p className="mt-2">
            No account is needed: <Link to="/report">choose the route</Link>, the fixed point on its line, and
            say what is wrong. Instead of signing in, leave an address and open the link mailed to it; another
            link, yours alone, shows what becomes of the report. The address lets us ask back and tell you
            when it is mended.
          </p>
          <p className="mt-3">
            Do not unclip, stay on it or lean out to measure or photograph. Somebody hurt? Call the emergency
            number first.
          </p>
        </section>
      </div>
    </Page>
  )
}
