import { z } from 'zod'
import type { EdgeClass, FindingKind } from '~/rating/finding'
import { choiceField, dayField, emailField, numberField, textField } from '~/web/fields.server'
import { depths, depthWords, edgeAnswers, looseAnswers, otherAnswers, rustAnswers, topics } from './questions'
import { howSeen } from './report'

const list = <T extends z.ZodType>(of: T) =>
  z.preprocess(value => (value === undefined ? [] : Array.isArray(value) ? value : [value]), z.array(of))

const edge = choiceField(edgeAnswers, { what: 'what the edge is like', example: '“a fingernail catches”' })

/** Today and the day before which nobody remembers, for the date somebody saw it. */
interface Days {
  today: string
  guest: boolean
  earliest: string
}

/**
 * The report form. Each topic ticked brings its own questions; unanswered measures stay unknown. A guest gives an
 * address; the day is not in the future.
 */
export function toReportSchema({ today, earliest, guest }: Days) {
  return z
    .object({
      clientKey: z.string({ error: 'Open the form again: its own mark is missing.' }).regex(/^[\w-]{20,64}$/),
      topic: list(z.enum(topics)).refine(chosen => chosen.length > 0, {
        error: 'Tick what is wrong, for example “Groove or wear”.',
      }),
      part: z.string().max(40).optional(),
      depth: z.enum(depths).optional(),
      depthMm: numberField({
        what: 'the depth of the groove',
        unit: 'mm',
        min: 0.1,
        max: 30,
        example: '3.3',
      }).optional(),
      grooveEdge: edge.optional(),
      sharpEdge: edge.optional(),
      loose: list(z.enum(looseAnswers)),
      rust: z.enum(rustAnswers).optional(),
      else: z.enum(otherAnswers).optional(),
      howSeen: choiceField(howSeen, { what: 'how you saw it', example: '“on it”' }),
      seenOn: dayField({ what: 'the day you saw it', example: today })
        .refine(
          day => day <= today,
          `That day is still to come. Type the day you saw it, for example ${today}.`,
        )
        .refine(day => day >= earliest, `That is long ago. Type the day you saw it, for example ${today}.`),
      words: textField({
        what: 'what you saw',
        example: 'the groove is on the left side of the ring',
        max: 2000,
        lines: true,
      }).optional(),
      email: guest ? emailField() : emailField().optional(),
      photo: list(z.string().regex(/^[0-9a-f]{32}$/)),
    })
    .superRefine((value, context) => {
      const asks = (path: string, message: string) =>
        context.addIssue({ code: 'custom', path: [path], message })
      if (value.topic.includes('loose') && value.loose.length === 0)
        asks('loose', 'Tick what is loose, for example “the hanger spins”.')
      if (value.topic.includes('rust') && value.rust === undefined)
        asks('rust', 'Choose how much rust you saw, for example “a few spots”.')
      if (value.topic.includes('sharp') && value.sharpEdge === undefined)
        asks('sharpEdge', 'Choose what the edge is like, for example “a fingernail catches”.')
      if (value.topic.includes('other') && value.else === undefined)
        asks('else', 'Choose what else is wrong, for example “bent”, or “none of these” and say it in words.')
      if (value.topic.includes('other') && value.else === 'other' && value.words === undefined)
        asks('words', 'Say in words what is wrong, for example “the belay stake leans”.')
    })
}

export type ReportForm = z.output<ReturnType<typeof toReportSchema>>

export interface NewFinding {
  kind: FindingKind
  partId: string | null
  unit: 'mm' | 'percent' | 'grade' | null
  low: number | null
  high: number | null
  method: string | null
  edge: EdgeClass | null
  triedByHand: boolean | null
}

/** The findings a filled-in form tells, one for each thing that is wrong; a measured depth goes before a guessed one. */
export function toFindings(form: ReportForm): NewFinding[] {
  const bare = { partId: form.part ?? null, unit: null, low: null, high: null, method: null, edge: null }
  const byHand = form.howSeen === 'on_it'
  const found: NewFinding[] = []
  if (form.topic.includes('groove'))
    found.push({
      ...bare,
      kind: 'groove',
      ...toDepth(form),
      edge: form.grooveEdge ?? null,
      triedByHand: byHand,
    })
  if (form.topic.includes('sharp'))
    found.push({ ...bare, kind: 'sharp_edge_rope', edge: form.sharpEdge!, triedByHand: byHand })
  if (form.topic.includes('loose'))
    for (const kind of form.loose) found.push({ ...bare, kind, triedByHand: byHand })
  if (form.topic.includes('rust')) found.push({ ...bare, ...toRust(form.rust!), triedByHand: null })
  if (form.topic.includes('other')) found.push({ ...bare, kind: form.else!, triedByHand: byHand })
  return found
}

function toDepth(form: ReportForm): Pick<NewFinding, 'unit' | 'low' | 'high' | 'method'> {
  if (form.depthMm !== undefined)
    return { unit: 'mm', low: form.depthMm, high: form.depthMm, method: 'measured' }
  if (form.depth === undefined) return { unit: null, low: null, high: null, method: null }
  const { low, high } = depthWords[form.depth]
  return { unit: 'mm', low, high, method: 'by_eye' }
}

function toRust(
  answer: NonNullable<ReportForm['rust']>,
): Pick<NewFinding, 'kind' | 'unit' | 'low' | 'high' | 'method'> {
  if (answer === 'cracked') return { kind: 'cracked', unit: null, low: null, high: null, method: null }
  const grade = Number(answer)
  return { kind: 'rust', unit: 'grade', low: grade, high: grade, method: 'by_eye' }
}
