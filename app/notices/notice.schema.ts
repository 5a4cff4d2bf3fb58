import { z } from 'zod'
import { addMonths } from '~/lib/dates'
import { formatDay } from '~/ui/when'
import { choiceField, dayField, textField } from '~/web/fields.server'
import { writtenKinds } from './notice'

/** The form of a notice; `today` is the crag's day: a review comes after it, an end not before. */
export function toNoticeSchema(today: string) {
  const later = addMonths(today, 2)
  return z.object({
    kind: choiceField(writtenKinds, { what: 'the kind of notice', example: '“Hazard”' }),
    headline: textField({
      what: 'a headline',
      example: 'Do not rely on the lower-off of Slack Water',
      max: 200,
    }),
    words: textField({
      what: 'what people are to know and do',
      example: 'The ring is worn. Lower from a connector of your own.',
      max: 2000,
      lines: true,
    }),
    decidedByWords: textField({ what: 'whose decision it is', example: 'Skerrow Access Forum', max: 200 }),
    ground: textField({ what: 'on what ground', example: 'worn ring reported by two climbers', max: 300 }),
    reviewOn: dayField({ what: 'the day it is looked at again', example: later }).refine(
      day => day > today,
      `That is not after today. Choose a day after ${formatDay(today)}, for example ${formatDay(later)}.`,
    ),
    endsOn: dayField({ what: 'the last day it holds', example: later })
      .refine(
        day => day >= today,
        `That day is over. Choose a day from ${formatDay(today)} on, for example ${formatDay(later)}, or leave it empty.`,
      )
      .optional(),
  })
}
