import { materials, materialWords, partKinds, partKindWords } from '~/crags/part'
import { Button } from '~/ui/button'
import { Field, Select } from '~/ui/field'
import { mostRows, type PartRow, toRowCount } from '../part-rows'
import { recordLabels as labels } from '../words'

interface Props {
  /** the list's name in the form: `needed` or `fitted` */
  name: string
  typed: Record<string, string | string[]>
  errors: Record<string, string>
  preset: PartRow[]
  /** what no part is called: "no part needed" */
  none: string
  /** the parts in place, where a part fitted comes in the place of one */
  choices?: { id: string; words: string }[]
  busy: boolean
}

/**
 * Parts, one after another, as orders need and records say them. Room for one more is made by the server, so that it
 * works without JavaScript and keeps what was typed.
 */
export function PartRows(props: Props) {
  const count = toRowCount(props.typed.rows, props.preset.length)
  return (
    <>
      <input type="hidden" name="rows" value={count} />
      {Array.from({ length: count }, (_, index) => (
        // biome-ignore lint/suspicious/noArrayIndexKey: a row is its number
        <fieldset key={index} className="grid gap-5">
          <legend className={count === 1 ? 'sr-only' : 'pb-2 font-medium'}>{`Part ${index + 1}`}</legend>
          <Row {...props} index={index} />
        </fieldset>
      ))}
      {count < mostRows && (
        <p>
          <Button kind="quiet" name="do" value="more" pending={props.busy}>
            One more part
          </Button>
        </p>
      )}
    </>
  )
}

function Row({ name, typed, errors, preset, none, choices, index }: Props & { index: number }) {
  const begun = preset[index]
  const wire = (key: string, before: string | number | null | undefined) => {
    const field = `${name}.${index}.${key}`
    return { name: field, defaultValue: String(typed[field] ?? before ?? ''), error: errors[field] }
  }
  return (
    <>
      <div className="grid gap-5 sm:grid-cols-3">
        <Select label={labels.kind} {...wire('kind', begun?.kind)} options={toKindOptions(none)} />
        <Select label={labels.material} {...wire('material', begun?.material)} options={materialOptions} />
        <Field label={labels.sizeMm} {...wire('sizeMm', begun?.sizeMm)} inputMode="decimal" />
      </div>
      {choices === undefined ? (
        <div className="grid gap-5 sm:grid-cols-3">
          <Field label="How many" {...wire('quantity', 1)} inputMode="numeric" />
        </div>
      ) : (
        <div className="grid gap-5 sm:grid-cols-2">
          <Select
            label={labels.replaces}
            {...wire('replaces', begun?.replaces)}
            options={[
              { value: '', label: 'nothing, it is new' },
              ...choices.map(({ id, words }) => ({ value: id, label: words })),
            ]}
          />
          <Field label={labels.marking} {...wire('marking', begun?.marking)} autoComplete="off" />
        </div>
      )}
    </>
  )
}

const toKindOptions = (none: string) => [
  { value: '', label: 'choose' },
  { value: 'none', label: none },
  ...partKinds.map(kind => ({ value: kind, label: partKindWords[kind] })),
]

const materialOptions = [
  { value: '', label: 'choose' },
  ...materials.map(one => ({ value: one, label: materialWords[one] })),
]
