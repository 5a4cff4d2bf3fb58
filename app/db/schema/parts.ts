import { double, index, mysqlTable, varchar } from 'drizzle-orm/mysql-core'
import { datePrecisions, materials, partKinds, type sides } from '../../crags/part'
import { day, oneOf, stamps, uuid } from '../columns'
import { anchors } from './crags'

export const makers = mysqlTable('makers', {
  id: uuid('id').primaryKey(),
  name: varchar('name', { length: 120 }).notNull().unique(),
})

export const parts = mysqlTable(
  'parts',
  {
    id: uuid('id').primaryKey(),
    anchorId: uuid('anchor_id')
      .notNull()
      .references(() => anchors.id),
    side: varchar('side', { length: 1 }).$type<(typeof sides)[number]>(),
    kind: varchar('kind', { length: 20 }).$type<(typeof partKinds)[number]>().notNull(),
    material: varchar('material', { length: 20 }).$type<(typeof materials)[number]>().notNull(),
    sizeMm: double('size_mm'),
    lengthMm: double('length_mm'),
    marking: varchar('marking', { length: 120 }),
    standard: varchar('standard', { length: 60 }),
    makerId: uuid('maker_id').references(() => makers.id),
    model: varchar('model', { length: 120 }),
    batch: varchar('batch', { length: 60 }),
    fittedOn: day('fitted_on'),
    fittedPrecision: varchar('fitted_precision', { length: 10 })
      .$type<(typeof datePrecisions)[number]>()
      .notNull(),
    removedOn: day('removed_on'),
    /** the work records that fitted it and took it out */
    fittedByRecord: uuid('fitted_by_record'),
    removedByRecord: uuid('removed_by_record'),
    ...stamps,
  },
  table => [
    index('parts_anchor').on(table.anchorId),
    oneOf('parts_kind', 'kind', partKinds),
    oneOf('parts_material', 'material', materials),
    oneOf('parts_precision', 'fitted_precision', datePrecisions),
  ],
)
