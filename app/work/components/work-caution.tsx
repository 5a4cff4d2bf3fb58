import { Caution } from '~/ui/caution'

/** The caution of every page somebody works from. */
export function WorkCaution() {
  return (
    <Caution>
      Work on fixed gear is for trained people, in twos, under local rules and with the owner’s consent. Never
      trust the gear you came to mend: rig from anchors of your own. The maker’s sheet comes first. This
      record does not certify any fixed gear.
    </Caution>
  )
}
