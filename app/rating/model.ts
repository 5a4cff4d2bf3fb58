import { cutRows, releaseRows } from './model-edges'
import { eventRows, loadRows } from './model-loads'
import { strengthRows, weightRows } from './model-strengths'

/** One number of the rating model with its range, unit, source and mark (std, book, prac, mem, ours). */
export interface ModelRow {
  name: string
  low: number
  central: number
  high: number
  unit: string
  source: string
  mark: string
}

/** Rating model 1: every number that a rating uses. */
export const modelRows: readonly ModelRow[] = [
  ...loadRows,
  ...eventRows,
  ...strengthRows,
  ...weightRows,
  ...cutRows,
  ...releaseRows,
]

/** A model to compute with: its numbers by name. */
export type RatingModel = ReadonlyMap<string, Pick<ModelRow, 'low' | 'central' | 'high'>>

/** The model of some rows, from the list above or from the database. */
export function toModel(rows: readonly ModelRow[]): RatingModel {
  return new Map(rows.map(row => [row.name, row]))
}
