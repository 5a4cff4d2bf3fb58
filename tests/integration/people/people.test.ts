import { beforeEach, expect, test } from 'vitest'
import { people } from '~/db/schema/people'
import { activities } from '~/db/schema/record'
import { editPerson } from '~/people/people.server'
import { testDatabase } from '../database'
import { actAt, day, later, noon } from './acting'

const { db, empty } = await testDatabase()
beforeEach(empty)

test('a person changes their own name; the record says that it was changed and not what it is', async () => {
  const act = actAt(later(day))
  const id = act.newId()
  const other = act.newId()
  const stamps = { createdAt: noon, updatedAt: noon }
  await db.insert(people).values([
    { id, name: 'mara', email: 'mara@example.org', ...stamps },
    { id: other, name: 'tove', email: 'tove@example.org', ...stamps },
  ])
  await editPerson(db, act, id, { name: 'Mára Quill 北', over18: true })
  const rows = await db.select().from(people).orderBy(people.email)
  expect(rows).toMatchObject([
    { name: 'Mára Quill 北', over18: true, updatedAt: later(day) },
    { name: 'tove', over18: false, updatedAt: noon },
  ])
  const lines = await db.select().from(activities)
  expect(lines).toMatchObject([{ verb: 'account-edited', subjectId: id, public: false }])
  expect(JSON.stringify(lines)).not.toContain('Quill')
})
