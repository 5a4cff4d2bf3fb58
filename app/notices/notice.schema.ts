import { z } from 'zod'
import { choiceField, dayField, textField } from '~/web/fields.server'
import { writtenKinds } from './notice'

/** The form of a notice; `today` is the crag's day, which a review cannot lie before. */
export function toNoticeSchema(today: string) {
  return z.object({
    kind: choiceField(writtenKinds, { what: 'the kind of notice', example: '“Hazard”' }),
    headline: textField({
      what: 'a headline',
      example: 'Do not rely on the lower-off of Slack Water',
      max: 160,
    }),
    words: textField({
      what: 'what people are to know and do',
      example: 'The ring is worn. Lower from a connector of your own.',
      max: 2000,
      lines: true,
    }),
    decidedByWords: textField({ what: 'whose decision it is', example: 'Skerrow Access Forum', max: 200 }),
    ground: textField({ what: 'on what ground', example: 'worn ring reported by two climbers', max: 300 }),
    reviewOn: dayField({ what: 'the day it is looked at again', example: today }).refine(day => day > today, {
      error: `That day is over. Type a day after ${today}, for example two months from now.`,
    }),
    endsOn: dayField({ what: 'the last day it holds', example: today })
      .refine(day => day >= today, `That day is over. Type a day from ${today} on, or leave it empty.`)
      .optional(),
  })
}
