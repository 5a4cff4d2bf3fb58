import { Caution } from '~/ui/caution'

/** The caution that stands on every step of a report. */
export function ReportCaution() {
  return (
    <Caution>
      Do not unclip, stay on it or lean out to measure or photograph. Somebody hurt? Call the emergency number
      first.
    </Caution>
  )
}
