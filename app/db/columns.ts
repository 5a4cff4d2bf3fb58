import { sql } from 'drizzle-orm'
import { check, customType, datetime } from 'drizzle-orm/mysql-core'

/** MariaDB's native uuid. */
export const uuid = customType<{ data: string; driverData: string }>({ dataType: () => 'uuid' })

/** A place, longitude first (SRID 4326 is set by migration: the generator does not know spatial columns). */
export const point = customType<{ data: { lon: number; lat: number }; driverData: unknown }>({
  dataType: () => 'point',
  toDriver: ({ lon, lat }) => sql`ST_GeomFromText(${`POINT(${lon} ${lat})`}, 4326)`,
  fromDriver: value => {
    const { x, y } = value as { x: number; y: number }
    return { lon: x, lat: y }
  },
})

/** A moment, UTC to the millisecond. */
export const moment = (name: string) => datetime(name, { mode: 'date', fsp: 3 })

/** A day without a time, as `2027-03-12`. */
export const day = customType<{ data: string; driverData: string }>({ dataType: () => 'date' })

/** When a row came and last changed, written by commands. */
export const stamps = {
  createdAt: moment('created_at').notNull(),
  updatedAt: moment('updated_at').notNull(),
}

/** A CHECK that a column holds one of a word list. */
export function oneOf(name: string, column: string, words: readonly string[]) {
  const list = words.map(word => `'${word}'`).join(', ')
  return check(name, sql.raw(`\`${column}\` in (${list})`))
}

/** A CHECK that exactly one of the columns is set: a target is a real foreign key, never kind and id. */
export function exactlyOne(name: string, ...columns: string[]) {
  const counted = columns.map(column => `(\`${column}\` is not null)`)
  return check(name, sql.raw(`${counted.join(' + ')} = 1`))
}
