import { formatPart, type Material, type PartKind } from '~/crags/part'

/** The most parts one form takes. */
export const mostRows = 8

interface Piece {
  kind: PartKind
  material: Material
  sizeMm: number | null
}

/** One part as a form begins with it. */
export interface PartRow extends Piece {
  marking: string | null
  /** the part in whose place it comes, or null */
  replaces: string | null
}

interface InPlace extends Piece {
  id: string
}

/** How many rows a form shows: as many as it was sent with, else as many as it begins with, at least one. */
export function toRowCount(sent: string | string[] | undefined, preset: number): number {
  const count = Number(sent)
  const asked = Number.isInteger(count) && count > 0 ? count : preset
  return Math.min(mostRows, Math.max(1, asked))
}

/** What was typed, with room for one more part. */
export function withOneMore<Typed extends Record<string, string | string[]>>(typed: Typed): Typed {
  return {
    ...typed,
    rows: String(toRowCount(typed.rows, 1) + (toRowCount(typed.rows, 1) < mostRows ? 1 : 0)),
  }
}

/**
 * What a record of work begins with: what an earlier record of the same order named, else each part the order needs,
 * in the place of one of its kind that is there, the part found at fault before all others.
 */
export function toPresetRows(given: {
  needed: readonly (Piece & { quantity: number })[]
  before: readonly (Piece & { marking: string | null; replaces: string | null })[]
  there: readonly InPlace[]
  faulty: string | null
}): PartRow[] {
  const { needed, before, there, faulty } = given
  if (before.length > 0) return before.slice(0, mostRows)
  const left = [...there].sort((a, b) => Number(b.id === faulty) - Number(a.id === faulty))
  const rows = needed.flatMap(part => Array.from({ length: part.quantity }, () => part))
  return rows.slice(0, mostRows).map(({ kind, material, sizeMm }) => {
    const same = left.findIndex(part => part.kind === kind)
    const at = same < 0 ? left.findIndex(part => part.id === faulty) : same
    const [replaced] = at < 0 ? [] : left.splice(at, 1)
    return { kind, material, sizeMm, marking: null, replaces: replaced?.id ?? null }
  })
}

/** The parts in place as a list to choose from; those that read the same are told apart by a number. */
export function toPartChoices(there: readonly InPlace[]): { id: string; words: string }[] {
  const words = there.map(formatPart)
  return there.map(({ id }, index) => {
    const same = words.filter(one => one === words[index])
    const number = words.slice(0, index + 1).filter(one => one === words[index]).length
    return { id, words: same.length > 1 ? `${words[index]} (${number} of ${same.length})` : words[index]! }
  })
}
