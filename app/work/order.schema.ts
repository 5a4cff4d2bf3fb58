import { z } from 'zod'
import { choiceField, dayField, textField } from '~/web/fields.server'
import { jobKinds } from './job'
import { neededRows, withRows } from './part-rows.schema'

/** The form of an order; where consent is not known a reason is asked. */
export function toOrderSchema({ today, consentUnknown }: { today: string; consentUnknown: boolean }) {
  const reason = textField({
    what: 'why the work goes on without the owner’s word',
    example: 'the owner could not be found; the access officer agrees',
    max: 1000,
    lines: true,
  })
  const order = z.object({
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
    needed: neededRows,
  })
  return withRows('needed', order)
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
