import type { ReactNode } from 'react'
import { Link } from 'react-router'

/** An honest page about what went wrong: what happened, what to do next. */
export function Problem(props: { status: number; title: string; words: string; children?: ReactNode }) {
  return (
    <main id="content" className="mx-auto min-h-[60vh] max-w-[1280px] px-4 pt-14 pb-12 md:px-12">
      <p className="text-s text-stone">{props.status}</p>
      <h1 className="mt-1 text-3 font-semibold">{props.title}</h1>
      <p className="mt-3 max-w-[62ch]">{props.words}</p>
      {props.children}
      <p className="mt-6 flex flex-wrap gap-x-6 gap-y-2">
        <Link to="/">To the map</Link>
        <Link to="/find">Look something up</Link>
        <Link to="/report">Report fixed gear</Link>
      </p>
    </main>
  )
}
