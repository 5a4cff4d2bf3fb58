import type { ReactNode } from 'react'

const tones = {
  oxide: { rule: 'border-t-oxide', label: 'text-oxide' },
  ochre: { rule: 'border-t-ochre', label: 'text-ochre' },
  slate: { rule: 'border-t-slate', label: 'text-slate' },
}

/** A band across the page: what kind of notice, its words, and whose it is. */
export function NoticeBand(props: {
  tone: keyof typeof tones
  label: string
  words: ReactNode
  by: ReactNode
}) {
  const tone = tones[props.tone]
  return (
    <div
      className={`mt-4 grid items-center gap-x-4 gap-y-1 border-t-2 border-b border-b-rule py-3 md:grid-cols-[auto_1fr_auto] ${tone.rule}`}
    >
      <b className={`font-semibold ${tone.label}`}>{props.label}</b>
      <span>{props.words}</span>
      <span className="text-s text-stone">{props.by}</span>
    </div>
  )
}
