import type { Subject } from '~/people/viewer'

/** A crag as permission asks about one order there: only roles in the order's own organisation count. */
export function toOrderSubject({ crag }: Required<Pick<Subject, 'crag'>>, organisationId: string) {
  return {
    crag: {
      ...crag,
      organisations: crag.organisations.filter(held => held.organisationId === organisationId),
    },
  }
}
