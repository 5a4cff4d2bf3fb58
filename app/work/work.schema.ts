import { z } from 'zod'
import { choiceField, dayField, numberField, textField } from '~/web/fields.server'
import { checkerKinds, checkMethods } from './order'
import { toFittedRows, withRows } from './part-rows.schema'

const reopened = 'This form has lost its mark. Open it again from the order.'

/**
 * The record of work: what was fitted and in whose place (`there`: ids of the parts in place), how long, words, a photo
 * (`photos`: how many go with the form) or why there is none.
 */
export function toRecordSchema({ today, photos, there }: { today: string; photos: number; there: string[] }) {
  const reason = z
    .string({ error: 'Add a photo of the work, or say why there is none, for example “the camera fell”.' })
    .max(500, 'Say in 500 characters why there is no photo, for example “the camera fell”.')
  const record = z
    .object({
      clientKey: z.string({ error: reopened }).regex(/^[\w-]{20,64}$/, reopened),
      doneOn: dayField({ what: 'the day it was done', example: today }).refine(
        day => day <= today,
        `That day is still to come. Type the day it was done, for example ${today}.`,
      ),
      minutes: numberField({
        ...{ what: 'how long it took', unit: 'min', min: 1, max: 1440, whole: true, example: '45' },
      }).optional(),
      fitted: toFittedRows(there),
      words: textField({
        ...{
          what: 'what was done',
          example: 'old ring cut off, new one closed and locked',
          max: 2000,
          lines: true,
        },
      }).optional(),
      noPhotoReason: photos === 0 ? reason : reason.optional(),
    })
    .superRefine(({ fitted, words }, context) => {
      const asks = (path: string, message: string) =>
        context.addIssue({ code: 'custom', path: [path], message })
      if (fitted.length === 0 && words === undefined)
        asks(
          'words',
          'Say what was done, for example “nut tightened to 25 Nm”, or choose the part that was fitted.',
        )
    })
  return withRows('fitted', record)
}

/** The check of work; returned work needs words. */
export const checkSchema = z
  .object({
    whoKind: choiceField(checkerKinds, { what: 'who you are to the work', example: '“independent”' }),
    how: choiceField(checkMethods, { what: 'how you checked', example: '“on the rope”' }),
    outcome: choiceField(['good', 'returned'], { what: 'what you found', example: '“in order”' }),
    words: textField({
      what: 'what you saw',
      example: 'gate of the ring is not locked',
      max: 2000,
      lines: true,
    }).optional(),
  })
  .superRefine(({ outcome, words }, context) => {
    if (outcome === 'returned' && words === undefined)
      context.addIssue({
        code: 'custom',
        path: ['words'],
        message: 'Say what is to be done again, for example “the link is not screwed shut”.',
      })
  })

/** Closing: the photos of the work the public may see. */
export const closeSchema = z.object({
  photo: z.preprocess(
    value => (value === undefined ? [] : [value].flat()),
    z.array(z.string().regex(/^[0-9a-f]{32}$/)),
  ),
})
