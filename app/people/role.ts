/** Roles are held per organisation. */
export const roles = ['rebolter', 'coordinator', 'access_officer', 'admin'] as const
export type Role = (typeof roles)[number]

export const roleWords: Record<Role, string> = {
  rebolter: 'rebolter',
  coordinator: 'coordinator',
  access_officer: 'access officer',
  admin: 'organisation admin',
}

/** What an organisation looks after at a crag. */
export const remits = ['rebolting', 'access'] as const
export type Remit = (typeof remits)[number]
