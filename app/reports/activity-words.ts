import type { SubjectKind } from '~/record/activity'

const words: Record<string, string> = {
  'anchor added': 'Put on record',
  'anchor checked': 'Checked: no fault seen',
  'anchor mended': 'Mended',
  'hazard opened': 'Hazard taken in',
  'hazard warned': 'Warning published',
  'hazard mended': 'Mended, check due',
  'hazard cleared': 'Hazard cleared',
  'hazard reopened': 'Open again',
  'report received': 'Report received',
  'report taken_in': 'Report taken in',
  'report on_record': 'Report put on record',
  'report needs_detail': 'Question asked',
  'report declined': 'Report declined',
  'report withdrawn': 'Report withdrawn',
  'report confirmed': 'Address confirmed',
  'part fitted': 'Part fitted',
  'part removed': 'Part taken out',
  'notice published': 'Notice published',
  'notice confirmed': 'First warning confirmed',
  'notice withdrawn': 'Notice withdrawn',
  'order made': 'Order made',
  'order offered': 'Offered',
  'order accepted': 'Accepted',
  'order done': 'Done, check due',
  'order checked': 'Work checked',
  'order returned': 'Work returned',
  'order closed': 'Closed',
  'order cancelled': 'Cancelled',
}

/** A line of the record in words, without anybody's name. */
export function formatActivity(line: { verb: string; subjectKind: SubjectKind }): string {
  const known = words[`${line.subjectKind} ${line.verb}`]
  if (known !== undefined) return known
  const plain = `${line.subjectKind} ${line.verb}`.replaceAll('_', ' ')
  return plain.charAt(0).toUpperCase() + plain.slice(1)
}
