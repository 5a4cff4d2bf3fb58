import { useEffect, useRef } from 'react'

/** What is wrong with a form, at its head: each sentence leads to its field; what else was refused stands with it. */
export function FormErrors(props: {
  errors: Record<string, string>
  reason?: string
  also?: string[]
  labels?: Record<string, string>
}) {
  const { errors, reason, also = [], labels = {} } = props
  const box = useRef<HTMLDivElement>(null)
  const list = Object.entries(errors)
  const count = list.length + also.length + (reason ? 1 : 0)
  // biome-ignore lint/correctness/useExhaustiveDependencies: focus moves each time the form comes back with errors
  useEffect(() => {
    box.current?.focus()
  }, [errors, reason])
  if (count === 0) return null
  return (
    <div
      ref={box}
      tabIndex={-1}
      role="alert"
      className="my-4 border-t-2 border-oxide bg-oxide-wash px-4 py-3"
    >
      <p className="font-semibold">
        {reason ?? 'Not sent yet. Put this right and send it again; everything else is kept.'}
      </p>
      <ul className="mt-1">
        {list.map(([name, sentence]) => (
          <li key={name}>
            <a href={`#field-${name}`} className="text-slate">
              {labels[name] ? `${labels[name]}: ${sentence}` : sentence}
            </a>
          </li>
        ))}
        {also.map(sentence => (
          <li key={sentence}>{sentence}</li>
        ))}
      </ul>
    </div>
  )
}
