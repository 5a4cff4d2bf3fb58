import { z } from 'zod'
import { materials, partKinds, sides } from '~/crags/part'
import { choiceField, dayField, numberField, textField } from '~/web/fields.server'
import { jobKinds } from './job'
import { checkerKinds, checkMethods } from './order'

const bar = { what: 'the size of the bar', unit: 'mm', min: 3, max: 40, example: '12' }
const partFields = {
  partKind: choiceField(partKinds, { what: 'the part', example: '“Ring”' }).optional(),
  partMaterial: choiceField(materials, { what: 'the material', example: '“titanium”' }).optional(),
  partSize: numberField(bar).optional(),
}

/** The form of an order; where consent is not known a reason is asked. */
export function toOrderSchema({ today, consentUnknown }: { today: string; consentUnknown: boolean }) {
  const reason = textField({
    what: 'why the work goes on without the owner’s word',
    example: 'the owner could not be found; the access officer agrees',
    max: 1000,
    lines: true,
  })
  return z.object({
    kind: choiceField(jobKinds, { what: 'the kind of job', example: '“Replace ring or link”' }),
    what: textField({
      what: 'what is to be done',
      example: 'Replace the worn ring by a titanium ring of 12 mm',
      max: 2000,
      lines: true,
    }),
    aimOn: dayField({ what: 'the day by which it should be done', example: today })
      .refine(day => day >= today, `That day is over. Type a day from ${today} on, or leave it empty.`)
      .optional(),
    consentReason: consentUnknown ? reason : reason.optional(),
    ...partFields,
    partQuantity: numberField({
      what: 'how many',
      unit: '',
      min: 1,
      max: 50,
      whole: true,
      example: '2',
    }).optional(),
  })
}

/** To whom a job is offered. */
export const offerSchema = z.object({
  personId: z
    .string({ error: 'Choose to whom the job is offered.' })
    .min(1, 'Choose to whom the job is offered.'),
})

/** A word that a form needs, with an example. */
export const wordsSchema = z.object({
  words: textField({ what: 'a word why', example: 'I hurt my wrist', max: 1000, lines: true }),
})

/** A word that may be left out. */
export const maybeWordsSchema = z.object({
  words: textField({ what: 'a word why', example: 'away that week', max: 1000, lines: true }).optional(),
})

/** The record of work: what was fitted and in whose place, how long, words, a photo or why there is none. */
export function toRecordSchema({ today, photos }: { today: string; photos: number }) {
  return z
    .object({
      clientKey: z.string({ error: 'Open the form again: its own mark is missing.' }).regex(/^[\w-]{20,64}$/),
      doneOn: dayField({ what: 'the day it was done', example: today }).refine(
        day => day <= today,
        `That day is still to come. Type the day it was done, for example ${today}.`,
      ),
      minutes: numberField({
        what: 'how long it took',
        unit: 'min',
        min: 1,
        max: 1440,
        whole: true,
        example: '45',
      }).optional(),
      replaces: z.string().max(40).optional(),
      ...partFields,
      partSide: z.enum(sides).optional(),
      partMarking: textField({ what: 'what is stamped on it', example: 'EN 959', max: 120 }).optional(),
      words: textField({
        what: 'what was done',
        example: 'old ring cut off, new one closed and locked',
        max: 2000,
        lines: true,
      }).optional(),
      noPhotoReason: textField({
        what: 'why there is no photo',
        example: 'the camera fell',
        max: 500,
        lines: true,
      }).optional(),
      photo: z.preprocess(
        value => (value === undefined ? [] : [value].flat()),
        z.array(z.string().regex(/^[0-9a-f]{32}$/)),
      ),
    })
    .superRefine((value, context) => {
      const asks = (path: string, message: string) =>
        context.addIssue({ code: 'custom', path: [path], message })
      if (photos === 0 && value.noPhotoReason === undefined)
        asks(
          'noPhotoReason',
          'Add a photo of the work, or say why there is none, for example “the camera fell”.',
        )
      if (value.partKind !== undefined && value.partMaterial === undefined)
        asks('partMaterial', 'Choose the material of what was fitted, for example “titanium”.')
      if (value.partKind === undefined && value.words === undefined)
        asks(
          'words',
          'Say what was done, for example “nut tightened to 25 Nm”, or choose the part that was fitted.',
        )
    })
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
