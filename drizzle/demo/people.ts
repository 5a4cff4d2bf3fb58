import type { Queryable } from '../../app/db/client.server'
import { membershipRoles, memberships, organisations, people } from '../../app/db/schema/people'
import type { Role } from '../../app/people/role'
import type { Act } from '../../app/record/act'

export const organisationNames = {
  access: 'Skerrow Access Forum',
  harrow: 'Harrow Bolt Crew',
  keld: 'Keld Rebolters',
} as const
type OrganisationKey = keyof typeof organisationNames

interface Account {
  key: string
  name: string
  email: string
  does: string
  organisation: OrganisationKey | null
  roles: Role[]
}

/** The invented people of Skerrow and what each can show. */
export const accounts: Account[] = [
  {
    key: 'ines',
    name: 'Ines Farrow',
    email: 'ines@keld.example',
    does: 'coordinator, Keld Rebolters',
    organisation: 'keld',
    roles: ['coordinator'],
  },
  {
    key: 'tam',
    name: 'Tam Ridley',
    email: 'tam@keld.example',
    does: 'rebolter, Keld Rebolters',
    organisation: 'keld',
    roles: ['rebolter'],
  },
  {
    key: 'joss',
    name: 'Joss Penhallow',
    email: 'joss@keld.example',
    does: 'rebolter, Keld Rebolters',
    organisation: 'keld',
    roles: ['rebolter'],
  },
  {
    key: 'edda',
    name: 'Edda Lorne',
    email: 'edda@keld.example',
    does: 'organisation admin, Keld Rebolters',
    organisation: 'keld',
    roles: ['admin'],
  },
  {
    key: 'oona',
    name: 'Oona Marrick',
    email: 'oona@forum.example',
    does: 'access officer, Skerrow Access Forum',
    organisation: 'access',
    roles: ['access_officer'],
  },
  {
    key: 'bram',
    name: 'Bram Heskin',
    email: 'bram@harrow.example',
    does: 'coordinator, Harrow Bolt Crew',
    organisation: 'harrow',
    roles: ['coordinator'],
  },
  {
    key: 'wyn',
    name: 'Wyn Calder',
    email: 'wyn@harrow.example',
    does: 'rebolter, Harrow Bolt Crew',
    organisation: 'harrow',
    roles: ['rebolter'],
  },
  {
    key: 'pia',
    name: 'Pia Thorne',
    email: 'pia@climbers.example',
    does: 'climber',
    organisation: null,
    roles: [],
  },
]

export interface DemoPeople {
  organisation: Record<OrganisationKey, string>
  person: Record<string, { id: string; email: string; name: string }>
}

/** Three organisations and the people in them. */
export async function seedPeople(db: Queryable, act: Act): Promise<DemoPeople> {
  const stamps = { createdAt: act.now, updatedAt: act.now }
  const made: DemoPeople = { organisation: { access: '', harrow: '', keld: '' }, person: {} }
  for (const [key, name] of Object.entries(organisationNames)) {
    const id = act.newId()
    await db
      .insert(organisations)
      .values({ id, name, timeZone: 'Atlantic/Azores', currency: 'EUR', ...stamps })
    made.organisation[key as OrganisationKey] = id
  }
  for (const account of accounts) {
    const id = act.newId()
    const { name, email } = account
    await db.insert(people).values({ id, name, email, emailConfirmedAt: act.now, over18: true, ...stamps })
    made.person[account.key] = { id, email, name }
    if (account.organisation === null) continue
    const membershipId = act.newId()
    const organisationId = made.organisation[account.organisation]
    await db.insert(memberships).values({ id: membershipId, organisationId, personId: id, ...stamps })
    for (const role of account.roles) await db.insert(membershipRoles).values({ membershipId, role })
  }
  return made
}
