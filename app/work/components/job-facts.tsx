import type { ReactNode } from 'react'
import { formatPart, type Material, type PartKind } from '~/crags/part'
import { formatDay } from '~/ui/when'

interface Job {
  cragName: string
  approach: string | null
  aimOn: string | null
  what: string
  consentReason: string | null
  hazards: {
    code: string
    headline: string
    position: string | null
    climbName: string | null
    alongM: number | null
  }[]
}

interface Needed {
  kind: PartKind
  material: Material
  sizeMm: number | null
  quantity: number
}

/** What a job is, in ruled lines of a word and its value: for the offer, the order and the sheet. */
export function JobFacts({ job, needed, consent }: { job: Job; needed: Needed[]; consent: string | null }) {
  return (
    <dl className="mt-5 max-w-[68ch] border-b border-rule">
      <Fact word="Where">
        {job.hazards.map(hazard => (
          <div key={hazard.code}>
            {`${hazard.position ?? ''} of ${hazard.climbName ?? ''}, ${job.cragName}`}
            {hazard.alongM !== null && <span className="text-stone">{`, ${hazard.alongM} m up`}</span>}
          </div>
        ))}
      </Fact>
      <Fact word="What is wrong">
        {job.hazards.map(hazard => (
          <div key={hazard.code}>{hazard.headline}</div>
        ))}
      </Fact>
      <Fact word="To do">
        <span className="whitespace-pre-line">{job.what}</span>
      </Fact>
      {needed.length > 0 && (
        <Fact word="Parts">
          {needed.map(part => (
            <div key={formatPart(part)}>{`${part.quantity} × ${formatPart(part)}`}</div>
          ))}
        </Fact>
      )}
      {job.aimOn && <Fact word="By">{formatDay(job.aimOn)}</Fact>}
      {job.approach && <Fact word="Way there">{job.approach}</Fact>}
      {consent && <Fact word="Owner’s conditions">{consent}</Fact>}
      {job.consentReason && <Fact word="Consent not known">{job.consentReason}</Fact>}
    </dl>
  )
}

/** One ruled line. */
export function Fact({ word, children }: { word: string; children: ReactNode }) {
  return (
    <div className="grid gap-x-6 border-t border-rule py-2.5 sm:grid-cols-[10rem_1fr]">
      <dt className="text-stone">{word}</dt>
      <dd>{children}</dd>
    </div>
  )
}
