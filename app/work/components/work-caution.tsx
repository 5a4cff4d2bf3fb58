import { Caution } from '~/ui/caution'
import { workCaution } from '../words'

/** The caution of every page somebody works from. */
export function WorkCaution() {
  return <Caution>{workCaution}</Caution>
}
