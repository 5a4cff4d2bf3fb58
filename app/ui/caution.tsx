import type { ReactNode } from 'react'

/** A caution where it is read: small, beside an ochre rule. */
export function Caution({ children }: { children: ReactNode }) {
  return (
    <p className="mt-3.5 max-w-[62ch] border-l-3 border-ochre py-0.5 pl-3 text-s text-stone">{children}</p>
  )
}
