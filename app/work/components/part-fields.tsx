import { materials, materialWords, partKinds, partKindWords } from '~/crags/part'
import { Field, Select } from '~/ui/field'

/** Kind, material and bar of one part, as orders need and records say them. */
export function PartFields(props: {
  typed: Record<string, string | string[]>
  errors: Record<string, string>
  preset?: { kind: string; material: string; sizeMm: number | null }
  none: string
}) {
  const { typed, errors, preset, none } = props
  const value = (name: string, before: string | undefined) => String(typed[name] ?? before ?? '')
  return (
    <div className="grid gap-5 sm:grid-cols-3">
      <Select
        label="Part"
        name="partKind"
        defaultValue={value('partKind', preset?.kind)}
        options={[
          { value: '', label: none },
          ...partKinds.map(kind => ({ value: kind, label: partKindWords[kind] })),
        ]}
        error={errors.partKind}
      />
      <Select
        label="Material"
        name="partMaterial"
        defaultValue={value('partMaterial', preset?.material)}
        options={[
          { value: '', label: 'choose' },
          ...materials.map(one => ({ value: one, label: materialWords[one] })),
        ]}
        error={errors.partMaterial}
      />
      <Field
        label="Bar, in mm"
        name="partSize"
        inputMode="decimal"
        defaultValue={value('partSize', preset?.sizeMm?.toString())}
        error={errors.partSize}
      />
    </div>
  )
}
