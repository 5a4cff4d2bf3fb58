import { describe, expect, it } from 'vitest'
import { parseForm } from '~/web/forms.server'
import { toOrderSchema } from '~/work/order.schema'
import { checkSchema, toRecordSchema } from '~/work/work.schema'

const today = '2027-05-02'
const toForm = (fields: Record<string, string>) => {
  const form = new FormData()
  for (const [name, value] of Object.entries(fields)) form.append(name, value)
  return form
}

describe('The form of a record', () => {
  const whole = {
    clientKey: 'abcdefghijklmnopqrstuvwx',
    doneOn: today,
    minutes: '40 min',
    'fitted.0.kind': 'ring',
    'fitted.0.material': 'titanium',
    'fitted.0.sizeMm': '12,5',
    'fitted.0.replaces': 'worn',
    noPhotoReason: 'The camera fell.',
  }
  const parse = (fields: Record<string, string>, photos = 0) =>
    parseForm(toRecordSchema({ today, photos, there: ['worn', 'other'] }), toForm({ ...whole, ...fields }))
  const errorsOf = (fields: Record<string, string>, photos = 0) => {
    const parsed = parse(fields, photos)
    return parsed.ok ? {} : parsed.errors
  }

  it('gives the parts fitted, one after another, without rows that say nothing', () => {
    const parsed = parse({
      'fitted.2.kind': 'quick_link',
      'fitted.2.material': 'stainless',
      'fitted.3.kind': 'none',
      'fitted.3.material': 'steel',
    })
    expect(parsed.ok && parsed.value.minutes).toBe(40)
    expect(parsed.ok && parsed.value.fitted).toEqual([
      { kind: 'ring', material: 'titanium', sizeMm: 12.5, marking: null, replaces: 'worn', side: null },
      { kind: 'quick_link', material: 'stainless', sizeMm: null, marking: null, replaces: null, side: null },
    ])
  })

  it('names each wrong field of each part by its own name', () => {
    expect(
      Object.keys(
        errorsOf({
          'fitted.0.sizeMm': 'thick',
          'fitted.1.kind': 'magnet',
          'fitted.1.replaces': 'elsewhere',
          doneOn: '2027-05-03',
        }),
      ).sort(),
    ).toEqual(['doneOn', 'fitted.0.sizeMm', 'fitted.1.kind', 'fitted.1.replaces'])
  })

  it('asks for the part or the material that is missing, with an example', () => {
    expect(errorsOf({ 'fitted.0.material': '' })).toEqual({
      'fitted.0.material': expect.stringMatching(/titanium/),
    })
    expect(errorsOf({ 'fitted.1.material': 'steel' })).toEqual({
      'fitted.1.kind': expect.stringMatching(/“Ring”/),
    })
  })

  it('takes one part out for one that comes in', () => {
    expect(
      errorsOf({ 'fitted.1.kind': 'ring', 'fitted.1.material': 'steel', 'fitted.1.replaces': 'worn' }),
    ).toEqual({ 'fitted.1.replaces': expect.stringMatching(/Another part above/) })
  })

  it('needs a photo or a reason for none', () => {
    expect(errorsOf({ noPhotoReason: '' })).toEqual({ noPhotoReason: expect.stringMatching(/Add a photo/) })
    expect(errorsOf({ noPhotoReason: '' }, 1)).toEqual({})
  })

  it('needs words where nothing was fitted', () => {
    const nothing = { 'fitted.0.kind': 'none' }
    expect(Object.keys(errorsOf(nothing))).toEqual(['words'])
    expect(errorsOf({ ...nothing, words: 'Nut tightened to 25 Nm.' })).toEqual({})
  })

  it('without its mark says to open it again', () => {
    expect(errorsOf({ clientKey: '' })).toEqual({ clientKey: expect.stringMatching(/Open it again/) })
  })
})

describe('The form of an order', () => {
  const parse = (fields: Record<string, string>, consentUnknown = false) =>
    parseForm(
      toOrderSchema({ today, consentUnknown }),
      toForm({ kind: 'replace_ring', what: 'New ring.', ...fields }),
    )

  it('gives the parts needed with their number', () => {
    const parsed = parse({ 'needed.0.kind': 'ring', 'needed.0.quantity': '2', 'needed.1.kind': 'none' })
    expect(parsed.ok && parsed.value.needed).toEqual([
      { kind: 'ring', material: 'unknown', sizeMm: null, quantity: 2 },
    ])
  })

  it('needs a reason only where consent is not known', () => {
    expect(parse({}).ok).toBe(true)
    expect(parse({}, true)).toMatchObject({ ok: false, errors: { consentReason: expect.any(String) } })
  })

  it('takes no day that is over', () => {
    expect(parse({ aimOn: '2027-05-01' })).toMatchObject({
      ok: false,
      errors: { aimOn: expect.stringMatching(/is over/) },
    })
    expect(parse({ aimOn: today }).ok).toBe(true)
  })
})

describe('The form of a check', () => {
  it('names all that is missing', () => {
    const parsed = parseForm(checkSchema, toForm({}))
    expect(parsed.ok ? [] : Object.keys(parsed.errors).sort()).toEqual(['how', 'outcome', 'whoKind'])
  })

  it('that returns the work says what is to be done again', () => {
    const returned = { whoKind: 'independent', how: 'on_the_rope', outcome: 'returned' }
    expect(parseForm(checkSchema, toForm(returned))).toMatchObject({
      ok: false,
      errors: { words: expect.stringMatching(/done again/) },
    })
    expect(parseForm(checkSchema, toForm({ ...returned, words: 'The link is open.' })).ok).toBe(true)
  })
})
