import { Link } from 'react-router'
import { caution } from '~/lib/caution'

/** Below every page: what this record is, and is not. */
export function Footer() {
  return (
    <footer className="mx-auto max-w-[1280px] px-4 pb-10 md:px-12">
      <div className="flex flex-wrap items-start justify-between gap-x-10 gap-y-3 border-t border-rule pt-4 text-s text-stone">
        <p className="max-w-[72ch]">{caution}</p>
        <Link to="/about" className="text-stone">
          About the record
        </Link>
      </div>
    </footer>
  )
}
