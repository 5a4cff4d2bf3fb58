import { z } from 'zod'
import { materials, partKinds } from '~/crags/part'
import { choiceField, numberField, textField } from '~/web/fields.server'
import { mostRows } from './part-rows'

/** Of the fields of a form those named `<name>.0.kind` become a list under `name`, and errors keep those names. */
export function withRows<S extends z.ZodType>(name: string, schema: S) {
  return z.preprocess(form => ({ ...(form as object), [name]: gatherRows(name, form as object) }), schema)
}

function gatherRows(name: string, form: object): Record<string, unknown>[] {
  const rows: Record<string, unknown>[] = []
  for (const [field, value] of Object.entries(form)) {
    const [list, index, key, ...rest] = field.split('.')
    if (list !== name || !/^\d$/.test(index ?? '') || !/^[a-zA-Z]+$/.test(key ?? '') || rest.length > 0)
      continue
    rows[Number(index)] = { ...rows[Number(index)], [key!]: value }
  }
  return Array.from(rows, row => row ?? {}).slice(0, mostRows)
}

const piece = {
  kind: choiceField([...partKinds, 'none'], { what: 'the part', example: '“Ring”' }).optional(),
  material: choiceField(materials, { what: 'the material', example: '“titanium”' }).optional(),
  sizeMm: numberField({
    ...{ what: 'the size of the bar', unit: 'mm', min: 3, max: 40, example: '12' },
  }).optional(),
}

type Asks = (field: string, message: string) => void
const toAsks =
  (context: z.core.$RefinementCtx): Asks =>
  (field, message) =>
    context.addIssue({ code: 'custom', path: [field], message })

/** Parts an order needs: kind, material, bar and how many. */
export const neededRows = z
  .array(
    z
      .object({
        ...piece,
        quantity: numberField({
          ...{ what: 'how many', unit: '', min: 1, max: 20, whole: true, example: '2' },
        }).optional(),
      })
      .superRefine(({ kind, material, sizeMm }, context) => {
        if (kind === undefined && (material !== undefined || sizeMm !== undefined))
          toAsks(context)('kind', 'Choose the part, for example “Ring”, or “no part needed”.')
      }),
  )
  .transform(rows =>
    rows.flatMap(({ kind, material = 'unknown' as const, sizeMm = null, quantity = 1 }) =>
      kind === undefined || kind === 'none' ? [] : [{ kind, material, sizeMm, quantity }],
    ),
  )

/** Parts that were fitted, each beside or in the place of one of `there` (ids of the parts in place). */
export function toFittedRows(there: readonly string[]) {
  const row = z
    .object({
      ...piece,
      marking: textField({ what: 'what is stamped on it', example: 'EN 959', max: 120 }).optional(),
      replaces: z
        .string()
        .refine(id => there.includes(id), 'This part is not in place here any more. Choose one of the list.')
        .optional(),
    })
    .superRefine(({ kind, material, sizeMm, marking }, context) => {
      const asks = toAsks(context)
      const fitted = kind !== undefined && kind !== 'none'
      if (fitted && material === undefined)
        asks('material', 'Choose the material of what was fitted, for example “titanium”.')
      if (kind === undefined && (material ?? sizeMm ?? marking) !== undefined)
        asks('kind', 'Choose the part that was fitted, for example “Ring”, or “nothing fitted”.')
    })
  return z
    .array(row)
    .superRefine((rows, context) => {
      const fitted = rows.map(one => (one.kind === 'none' ? undefined : one.kind && one.replaces))
      for (const [index, id] of fitted.entries())
        if (id !== undefined && fitted.indexOf(id) < index)
          context.addIssue({
            code: 'custom',
            path: [index, 'replaces'],
            message:
              'Another part above stands in the place of this one. Choose another, or “nothing, it is new”.',
          })
    })
    .transform(rows =>
      rows.flatMap(({ kind, material, sizeMm = null, marking = null, replaces = null }) =>
        kind === undefined || kind === 'none'
          ? []
          : [{ kind, material: material!, sizeMm, marking, replaces, side: null }],
      ),
    )
}
