import { type AnchorKind, anchorKindWords } from '~/crags/anchor'

export interface Said {
  /** what moves the figure, as a coordinator would say it */
  words: string
  /** the look or measure that would settle it, where there is one */
  look?: string
  /** the look seldom settles it: only when there is no better one */
  seldom?: true
}

const weights: Record<string, Said> = {
  unknown_age: {
    words: 'Age and maker not known',
    look: 'look for a maker’s mark and the fitting date',
    seldom: true,
  },
  old_plated: { words: 'How far rust has gone inside', look: 'look at the shank where it enters the rock' },
  self_drilled: {
    words: 'How short and how rusty the self-drilled sleeve is',
    look: 'plan its replacement; no look settles it',
  },
  nut_loose: {
    words: 'How tight the stud still sits in its hole',
    look: 'a spanner on the nut, five minutes',
  },
  spins: {
    words: 'Whether the stud is firm under the spinning hanger',
    look: 'a spanner on the nut, five minutes',
  },
  loose_in_hole: { words: 'How far the bolt moves in its hole', look: 'try it by hand from another point' },
  turns: {
    words: 'How much of the glue still holds',
    look: 'twist it by hand from another point, and say how far it turns',
  },
  resin_soft: {
    words: 'How soft the resin is all through',
    look: 'press a fingernail into the resin at the rim',
  },
  resin_gap: { words: 'How deep the gap in the resin goes', look: 'try the depth of the gap with a wire' },
  rock_hollow: {
    words: 'How much rock is hollow round it',
    look: 'tap the rock all round and mark where it sounds hollow',
  },
  rock_cracked: {
    words: 'How far the crack in the rock goes',
    look: 'follow the crack and say how near it runs',
  },
  bent: { words: 'What bent it, and how far', look: 'say how far it stands proud' },
  cracking_possible: {
    words: 'Hidden cracking by a warm sea',
    look: 'find out what steel it is; no look or pull shows the cracks',
  },
  cracking_spots: {
    words: 'Hidden cracking by a warm sea, with rust spots',
    look: 'find out what steel it is; no look or pull shows the cracks',
  },
  cracking_known: { words: 'Others like it have failed there', look: 'replace one and have it cut' },
  sling_unknown: {
    words: 'Age of the cord or sling',
    look: 'feel whether it is stiff, and look under the knot',
  },
  sling_faded: {
    words: 'How far the sun has gone into the fabric',
    look: 'feel whether it is stiff, and look under the knot',
  },
  peg_unknown: { words: 'How much of the peg is sound behind the rock', look: 'tap it and try it by hand' },
  peg_loose: { words: 'How loose the peg is', look: 'try it by hand from another point' },
  link_unscrewed: {
    words: 'How far the link has unscrewed',
    look: 'screw it shut with a spanner, five minutes',
  },
  rust3: { words: 'How deep the rust goes', look: 'brush it and look for flakes' },
  rust4: { words: 'How deep the rust goes', look: 'measure what is left of the bar' },
  rust5: { words: 'How deep the rust goes', look: 'measure what is left of the bar' },
  hanger_cracked: { words: 'How far the crack goes', look: 'a close photograph from both sides' },
}

const edges: Record<string, string> = {
  smooth: 'How smooth the rope’s way over it is',
  rounded: 'How round the shoulders of the groove are',
  felt: 'How sharp the edge is that a fingernail feels',
  sharp: 'How sharp the edge is',
  knife: 'How sharp the edge is',
}

/** What a number of the model means in words, and what would settle it. */
export function toReason(name: string, kind: AnchorKind): Said {
  const [group, of = ''] = name.split('.')
  const point = anchorKindWords[kind].toLowerCase()
  switch (group) {
    case 'weight':
      return weights[of] ?? { words: `How many of its kind are weak, as far as is known` }
    case 'cut':
      return {
        words: edges[name.split('.')[2] ?? ''] ?? 'How sharp the edge is',
        look: 'run a fingernail over the edge, and photograph it close',
      }
    case 'edge':
      return {
        words:
          of === 'unfelt'
            ? 'How sharp the edge is, which nobody has felt'
            : 'Whether the edge is sharper than it feels',
        look: 'run a fingernail over the edge, and photograph it close',
      }
    case 'measure':
    case 'section':
      return {
        words: of === 'section' ? 'How much of the section is lost' : 'How deep the groove is',
        look: 'measure the thinnest place with the wear gauge',
      }
    case 'material':
      return {
        words: 'Whether it is of a stainless steel that may crack by a warm sea',
        look: 'find out what steel it is; no look or pull shows the cracks',
      }
    case 'release':
      return { words: 'How easily it lets the rope out' }
    case 'falls':
      return { words: `How often people fall on this ${point}` }
    case 'ascents':
      return { words: 'How much the route is climbed', look: 'count ascents on a few days', seldom: true }
    case 'strength':
      return { words: 'How strong parts of this kind and condition are' }
    case 'common':
      return {
        words: 'Whether both sides have the same fault',
        look: 'look at the other side and try it by hand',
      }
    case 'shock':
      return { words: 'The jerk on the side that is left' }
    case 'body':
    case 'brake':
    case 'r':
    case 'slack':
      return { words: 'How hard falls are caught' }
    case 'avoided':
      return { words: 'How many go on although they see it' }
    default:
      return { words: 'How strong parts of this kind and condition are' }
  }
}
