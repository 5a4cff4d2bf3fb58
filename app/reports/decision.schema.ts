import { z } from 'zod'
import { choiceField, textField } from '~/web/fields.server'

export const decisions = ['take_in', 'on_record', 'ask', 'decline'] as const

/** What a coordinator decides about a report: a question needs words, and so does a decline. */
export const decisionSchema = z
  .object({
    decision: choiceField(decisions, { what: 'what to do with it', example: '“Take in”' }),
    question: textField({
      what: 'your question',
      example: '“which of the two rings?”',
      max: 1000,
      lines: true,
    }).optional(),
    reason: textField({
      what: 'the reason the reporter reads',
      example: '“this is hangerless by design”',
      max: 1000,
      lines: true,
    }).optional(),
    photo: z.preprocess(
      value => (value === undefined ? [] : [value].flat()),
      z.array(z.string().regex(/^[0-9a-f]{32}$/)),
    ),
  })
  .superRefine(({ decision, question, reason }, context) => {
    if (decision === 'ask' && question === undefined)
      context.addIssue({
        code: 'custom',
        path: ['question'],
        message: 'Type your question, for example “which of the two rings?”.',
      })
    if (decision === 'decline' && reason === undefined)
      context.addIssue({
        code: 'custom',
        path: ['reason'],
        message: 'Type the reason the reporter reads, for example “this is hangerless by design”.',
      })
  })
