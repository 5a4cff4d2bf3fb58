import type { ReactNode } from 'react'

/** An empty page: what would be here, and how to begin. */
export function Empty({ title, children }: { title: string; children: ReactNode }) {
  return (
    <div className="mt-6 max-w-[62ch] border-t border-slate pt-4">
      <p className="text-1 font-semibold">{title}</p>
      <p className="mt-1 text-stone">{children}</p>
    </div>
  )
}
