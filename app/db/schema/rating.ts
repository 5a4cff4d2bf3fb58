import { double, index, int, json, mysqlTable, primaryKey, text, varchar } from 'drizzle-orm/mysql-core'
import { bands } from '../../rating/band'
import { exactlyOne, moment, oneOf, uuid } from '../columns'
import { hazards, reports } from './reports'

export const ratingModels = mysqlTable('rating_models', {
  id: uuid('id').primaryKey(),
  number: int('number').notNull().unique(),
  adoptedAt: moment('adopted_at').notNull(),
})

export const ratingValues = mysqlTable(
  'rating_values',
  {
    modelId: uuid('model_id')
      .notNull()
      .references(() => ratingModels.id),
    name: varchar('name', { length: 120 }).notNull(),
    low: double('low').notNull(),
    central: double('central').notNull(),
    high: double('high').notNull(),
    unit: varchar('unit', { length: 80 }).notNull(),
    source: text('source').notNull(),
    mark: varchar('mark', { length: 10 }).notNull(),
  },
  table => [primaryKey({ columns: [table.modelId, table.name] })],
)

/** One computation of an urgency: never changed, and repeatable from its inputs and versions. */
export const ratings = mysqlTable(
  'ratings',
  {
    id: uuid('id').primaryKey(),
    reportId: uuid('report_id').references(() => reports.id),
    hazardId: uuid('hazard_id').references(() => hazards.id),
    modelId: uuid('model_id')
      .notNull()
      .references(() => ratingModels.id),
    engine: varchar('engine', { length: 20 }).notNull(),
    inputs: json('inputs').notNull(),
    inputsHash: varchar('inputs_hash', { length: 64 }).notNull(),
    results: json('results').notNull(),
    bandLow: varchar('band_low', { length: 10 }).$type<(typeof bands)[number]>().notNull(),
    band: varchar('band', { length: 10 }).$type<(typeof bands)[number]>().notNull(),
    bandHigh: varchar('band_high', { length: 10 }).$type<(typeof bands)[number]>().notNull(),
    cause: varchar('cause', { length: 60 }).notNull(),
    at: moment('at').notNull(),
  },
  table => [
    index('ratings_hazard').on(table.hazardId, table.at),
    index('ratings_report').on(table.reportId, table.at),
    oneOf('ratings_band', 'band', bands),
    exactlyOne('ratings_of', 'report_id', 'hazard_id'),
  ],
)
