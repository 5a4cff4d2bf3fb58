import { type ComponentProps, type ReactNode, useId } from 'react'

interface Around {
  label: string
  hint?: string
  error?: string
}

/** Label above, hint, the control, and what is wrong with an example, tied together for every reader. */
function Labelled(props: Around & { id: string; children: ReactNode }) {
  return (
    <div className="grid gap-1">
      <label htmlFor={props.id} className="font-medium">
        {props.label}
      </label>
      {props.hint && (
        <p id={`${props.id}-hint`} className="text-s text-stone">
          {props.hint}
        </p>
      )}
      {props.children}
      {props.error && (
        <p id={`${props.id}-error`} className="text-oxide">
          {props.error}
        </p>
      )}
    </div>
  )
}

function useWiring({ hint, error }: Around, name: string | undefined) {
  const generated = useId()
  // the summary of errors links to the field by its name
  const id = name === undefined ? generated : `field-${name}`
  const described = [hint && `${id}-hint`, error && `${id}-error`].filter(Boolean).join(' ')
  return {
    id,
    'aria-describedby': described || undefined,
    'aria-invalid': error ? (true as const) : undefined,
  }
}

/** A field of one line. */
export function Field({ label, hint, error, ...rest }: Around & ComponentProps<'input'>) {
  const wired = useWiring({ label, hint, error }, rest.name)
  return (
    <Labelled label={label} hint={hint} error={error} id={wired.id}>
      <input type="text" {...rest} {...wired} className="control" />
    </Labelled>
  )
}

/** A field for a day, which the browser helps to choose. */
export function DateField(props: Around & ComponentProps<'input'>) {
  return <Field {...props} type="date" />
}

/** A field of several lines. */
export function TextArea({ label, hint, error, ...rest }: Around & ComponentProps<'textarea'>) {
  const wired = useWiring({ label, hint, error }, rest.name)
  return (
    <Labelled label={label} hint={hint} error={error} id={wired.id}>
      <textarea {...rest} {...wired} className="control" />
    </Labelled>
  )
}

/** One of a list. */
export function Select({
  label,
  hint,
  error,
  options,
  ...rest
}: Around & { options: { value: string; label: string }[] } & ComponentProps<'select'>) {
  const wired = useWiring({ label, hint, error }, rest.name)
  return (
    <Labelled label={label} hint={hint} error={error} id={wired.id}>
      <select {...rest} {...wired} className="control">
        {options.map(option => (
          <option key={option.value} value={option.value}>
            {option.label}
          </option>
        ))}
      </select>
    </Labelled>
  )
}
