/** The short caution, in the words in which it stands wherever the record is read. */
export const caution =
  'This record helps to decide what to mend first. It does not certify any fixed gear. Inspect, judge and back up for yourself; work on fixed gear is for trained people, under local rules and with the owner’s consent.'
