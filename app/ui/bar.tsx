import { Form, Link } from 'react-router'
import { EyeBolt } from './wordmark'

interface Item {
  to: string
  label: string
}

/** The bar above every page; on a phone its entries stand behind "Menu", which needs no JavaScript. */
export function Bar(props: { items: Item[]; current: string; report: boolean; account: Item | null }) {
  const { items, current, report, account } = props
  return (
    <header className="bar">
      <a href="#content" className="sr-only focus:not-sr-only">
        To the content
      </a>
      <Link to="/" className="wordmark">
        <EyeBolt size={24} />
        Cragfettle
      </Link>
      <nav aria-label="Main">
        <Entries items={items} current={current} />
      </nav>
      <span className="grow" />
      <Search />
      {report && (
        <Link to="/report" className="btn btn-action">
          Report fixed gear
        </Link>
      )}
      {account && (
        <Link to={account.to} className="bar-account">
          {account.label}
        </Link>
      )}
      <details>
        <summary>Menu</summary>
        <div>
          <nav aria-label="Menu">
            <Entries items={account ? [...items, account] : items} current={current} stacked />
          </nav>
          <Search />
        </div>
      </details>
    </header>
  )
}

function Entries({ items, current, stacked }: { items: Item[]; current: string; stacked?: boolean }) {
  return (
    <ul className={stacked ? 'block!' : undefined}>
      {items.map(item => (
        <li key={item.to}>
          <Link to={item.to} aria-current={item.to === current ? 'page' : undefined}>
            {item.label}
          </Link>
        </li>
      ))}
    </ul>
  )
}

function Search() {
  return (
    <Form action="/find" method="get" role="search">
      <input
        type="search"
        name="q"
        aria-label="Crag, route or tag code"
        placeholder="Crag, route or tag code"
        className="control"
      />
    </Form>
  )
}

/** The bar of a step on the phone: the way back, what this is, and a quiet word. */
export function StepBar({ back, title, note }: { back: string; title: string; note?: string }) {
  return (
    <header className="flex h-[52px] items-center gap-3 border-b border-rule bg-sheet px-4">
      <Link
        to={back}
        aria-label="Back"
        className="grid size-11 -ml-3 place-items-center text-[20px] text-slate no-underline"
      >
        ←
      </Link>
      <b className="font-semibold">{title}</b>
      <span className="grow" />
      {note && <span className="text-s text-stone">{note}</span>}
    </header>
  )
}
