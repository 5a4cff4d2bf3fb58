import { describe, expect, it } from 'vitest'
import { toDay, toDayEnd } from '~/lib/dates'

describe('The last moment of a day', () => {
  it.each([
    // summer time of the Azores is UTC
    ['2027-07-01', 'Atlantic/Azores', '2027-07-01T23:59:59.999Z'],
    ['2027-01-15', 'Atlantic/Azores', '2027-01-16T00:59:59.999Z'],
    ['2027-01-15', 'Pacific/Kiritimati', '2027-01-15T09:59:59.999Z'],
    ['2027-01-15', 'Pacific/Pago_Pago', '2027-01-16T10:59:59.999Z'],
    ['2027-01-15', 'UTC', '2027-01-15T23:59:59.999Z'],
  ])('of %s in %s is %s', (day, zone, end) => {
    expect(toDayEnd(day, zone).toISOString()).toBe(end)
  })

  it('is followed by the next day, also on the nights when clocks change', () => {
    for (const day of ['2027-03-27', '2027-03-28', '2027-10-30', '2027-10-31', '2027-12-31'])
      for (const zone of ['Atlantic/Azores', 'Europe/Lisbon', 'America/Havana', 'Australia/Lord_Howe']) {
        const end = toDayEnd(day, zone)
        expect([day, zone, toDay(end, zone)]).toEqual([day, zone, day])
        expect([day, zone, toDay(new Date(end.getTime() + 1), zone) > day]).toEqual([day, zone, true])
      }
  })
})
