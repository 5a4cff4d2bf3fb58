import type { z } from 'zod'
import type { Typed } from './responses'

export type Parsed<T> =
  | { ok: true; value: T; typed: Typed }
  | { ok: false; errors: Record<string, string>; typed: Typed }

// a longer value than any field takes is cut before it is read or sent back
const longest = 20_000
const mostValues = 500

// controls but tab and line feed, byte order mark, code points that are no characters, halves of pairs
const useless = /[^\P{Cc}\t\n]|\ufeff|\p{Noncharacter_Code_Point}|\p{Cs}/gu
const directionOverrides = /[\u202d\u202e]/g

/**
 * Text as it is kept: well formed, in Unicode's composed form (NFC), lines ended by one line feed, without control
 * characters and forced writing directions, blanks at both ends taken away. Letters of every script stay.
 */
export function cleanText(text: string): string {
  return text
    .slice(0, longest)
    .normalize('NFC')
    .replace(/\r\n?|\u2028|\u2029/g, '\n')
    .replace(useless, '')
    .replace(directionOverrides, '')
    .trim()
}

/** What was typed into a form, cleaned, files left out; a name sent more than once becomes a list. */
export function toTyped(form: FormData): Typed {
  const typed = new Map<string, string | string[]>()
  for (const [name, value] of [...form].slice(0, mostValues)) {
    if (typeof value !== 'string') continue
    const before = typed.get(name)
    const text = cleanText(value)
    typed.set(name, before === undefined ? text : [before, text].flat())
  }
  return Object.fromEntries([...typed].filter(([name]) => name !== '__proto__'))
}

/** An empty field counts as not sent, so that `optional()` means what a person thinks it means. */
function toInput(typed: Typed): Record<string, unknown> {
  return Object.fromEntries(Object.entries(typed).filter(([, value]) => value !== ''))
}

/**
 * Reads a form by its schema. Of each wrong field the first message is given under the field's name (nested names
 * joined by dots); a message about the whole form stands under an empty name.
 */
export function parseForm<S extends z.ZodType>(schema: S, form: FormData): Parsed<z.output<S>> {
  const typed = toTyped(form)
  const result = schema.safeParse(toInput(typed))
  if (result.success) return { ok: true, value: result.data, typed }
  const errors: Record<string, string> = {}
  for (const issue of result.error.issues) errors[issue.path.join('.')] ??= issue.message
  return { ok: false, errors, typed }
}

/** The form a request carries; a body that is no form is an empty one, so that every field says what is missing. */
export async function readForm(request: Request): Promise<FormData> {
  try {
    return await request.formData()
  } catch (error) {
    if (error instanceof TypeError) return new FormData()
    throw error
  }
}
