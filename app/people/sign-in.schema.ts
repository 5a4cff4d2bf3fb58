import { z } from 'zod'
import { emailField, textField, tickField } from '~/web/fields.server'
import { parseDigits } from './code'

export const AskForm = z.object({ email: emailField() })

const digitsWanted = 'Type the eight digits from the mail, for example 4821 9306.'

export const CodeForm = z.object({
  code: z.string({ error: digitsWanted }).transform((text, context) => {
    const digits = parseDigits(text)
    if (digits !== null) return digits
    context.addIssue({ code: 'custom', message: digitsWanted })
    return z.NEVER
  }),
})

export const AccountForm = z.object({
  name: textField({ what: 'the name people know you by', example: 'Mara Quill', max: 120 }),
  over18: tickField(),
})
