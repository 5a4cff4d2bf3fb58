interface Option {
  value: string
  label: string
  hint?: string
}

interface Asked {
  legend: string
  name: string
  options: Option[]
  error?: string
}

/** Ruled rows to tick or to choose one of; what is chosen lies on a wash. */
export function Choices(
  props: Asked & { type: 'checkbox' | 'radio'; chosen?: string[]; hideLegend?: boolean },
) {
  const { legend, name, options, error, type, chosen = [], hideLegend } = props
  const errorId = `field-${name}-error`
  return (
    <fieldset id={`field-${name}`} tabIndex={-1} aria-describedby={error ? errorId : undefined}>
      <legend className={hideLegend ? 'sr-only' : 'pb-2 text-1 font-semibold'}>{legend}</legend>
      {error && (
        <p id={errorId} className="pb-2 text-oxide">
          {error}
        </p>
      )}
      <div className="border-b border-rule">
        {options.map(option => (
          <label key={option.value} className="choice">
            <input
              type={type}
              name={name}
              value={option.value}
              defaultChecked={chosen.includes(option.value)}
            />
            <span>
              <span className="font-medium">{option.label}</span>
              {option.hint && <span className="text-s text-stone">{` ${option.hint}`}</span>}
            </span>
          </label>
        ))}
      </div>
    </fieldset>
  )
}

/** A few short answers side by side, one of which may be chosen. */
export function Segments({ legend, name, options, error, chosen }: Asked & { chosen?: string }) {
  const errorId = `field-${name}-error`
  return (
    <fieldset id={`field-${name}`} tabIndex={-1} aria-describedby={error ? errorId : undefined}>
      <legend className="pb-2 text-1 font-semibold">{legend}</legend>
      <div className="segments">
        {options.map(option => (
          <label key={option.value}>
            <input type="radio" name={name} value={option.value} defaultChecked={chosen === option.value} />
            {option.label}
          </label>
        ))}
      </div>
      {error && (
        <p id={errorId} className="pt-1 text-oxide">
          {error}
        </p>
      )}
    </fieldset>
  )
}
