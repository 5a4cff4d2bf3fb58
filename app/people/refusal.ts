import { type Action, rules } from './permission'
import { roleWords } from './role'
import type { Viewer } from './viewer'

const doings: Record<Action, string> = {
  'record:see': 'see this record',
  'report:send': 'send a report here',
  'report:own': 'see this report and what came of it',
  'report:decide': 'decide on reports',
  'reporter:see': 'see who reported',
  'photo:full': 'see this photo in full size',
  'urgency:see': 'see how urgent this is',
  'hazard:manage': 'change this hazard',
  'warning:publish': 'publish a first warning',
  'warning:withdraw': 'withdraw this first warning',
  'notice:manage': 'publish, revise or withdraw notices',
  'order:see': 'see this job',
  'order:manage': 'change this job',
  'offer:answer': 'answer this offer',
  'work:record': 'record work here',
  'check:make': 'check this work',
  'account:see': 'see this account',
}

/** Why the viewer may not do the action: who may, and what to do next. */
export function toRefusal(viewer: Viewer, action: Action): string {
  const rule = rules[action]
  const next = viewer.person === null ? ' Sign in if that is you.' : ' Ask them, or ask them for the role.'
  if (rule.to === 'anyone')
    return `Only members of the organisations that look after this crag may ${doings[action]}.`
  if (rule.to === 'person') return `Only somebody signed in may ${doings[action]}. Sign in first.`
  if (rule.to === 'own') return `Only the person it belongs to may ${doings[action]}.`
  const who = rule.roles
    .map(role => `${/^[aeiou]/.test(roleWords[role]) ? 'an' : 'a'} ${roleWords[role]}`)
    .join(' or ')
  const where = rule.leadOnly
    ? 'of the organisation that leads at this crag'
    : 'of an organisation that looks after this crag'
  return `Only ${who} ${where} may ${doings[action]}.${next}`
}
