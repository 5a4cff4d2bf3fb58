import { z } from 'zod'
import { parseEmailAddress } from './email-address'

/** What a field asks for in words (`the name of the crag`) and an example of what is right. */
interface Asked {
  what: string
  example: string
}

const missing = ({ what, example }: Asked) => `Type ${what}, for example ${example}.`

const count = (text: string) => Array.from(text).length

/** Text of at most `max` characters as people count them; in one line unless `lines`. */
export function textField({ max, lines = false, ...asked }: Asked & { max: number; lines?: boolean }) {
  return z
    .string({ error: missing(asked) })
    .transform(text => (lines ? text : text.replace(/\s+/g, ' ')))
    .refine(text => text !== '', missing(asked))
    .refine(text => count(text) <= max, {
      error: issue =>
        `This has ${count(String(issue.input))} characters; ${max} fit. Shorten it, for example to ${asked.example}.`,
    })
}

/** An e-mail address in its kept form: small letters, plain (ASCII) letters only. */
export function emailField() {
  const words = 'Type an e-mail address with an @ and a dot after it, for example mara@example.org.'
  return z.string({ error: words }).transform((text, context) => {
    const address = parseEmailAddress(text)
    if (address !== null) return address
    context.addIssue({ code: 'custom', message: words })
    return z.NEVER
  })
}

/** A number between `min` and `max` in a unit; a comma may stand for the point, the unit may be typed after it. */
export function numberField({
  min,
  max,
  unit,
  whole = false,
  ...asked
}: Asked & { min: number; max: number; unit: string; whole?: boolean }) {
  const range = `from ${min} to ${max}${unit && ` ${unit}`}`
  const words = `Type ${asked.what} as a ${whole ? 'whole ' : ''}number ${range}, for example ${asked.example}.`
  return z.string({ error: words }).transform((text, context) => {
    const bare = text.replace(',', '.').replace(/\s+/g, '')
    const number = unit && bare.endsWith(unit) ? bare.slice(0, -unit.length) : bare
    const value = /^[+-]?\d+(\.\d+)?$/.test(number) ? Number(number) : Number.NaN
    if (value >= min && value <= max && (!whole || Number.isInteger(value))) return value
    context.addIssue({ code: 'custom', message: words })
    return z.NEVER
  })
}

/** One of a list of words; the message names what to choose. */
export function choiceField<const W extends readonly [string, ...string[]]>(words: W, asked: Asked) {
  return z.enum(words, { error: `Choose ${asked.what}, for example ${asked.example}.` })
}

/** A day as the browser's date field sends it (`2027-03-12`), which the calendar has. */
export function dayField(asked: Asked) {
  const words = `Type ${asked.what} as year-month-day, for example ${asked.example}.`
  return z
    .string({ error: words })
    .refine(text => /^\d{4}-\d{2}-\d{2}$/.test(text) && isOnCalendar(text), words)
}

function isOnCalendar(day: string): boolean {
  const at = new Date(`${day}T00:00:00Z`)
  return !Number.isNaN(at.getTime()) && at.toISOString().startsWith(day)
}

/** A box to tick: true when ticked. */
export function tickField() {
  return z
    .string()
    .optional()
    .transform(value => value !== undefined)
}
