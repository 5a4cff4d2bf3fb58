/** A place on the ground of Skerrow, longitude and latitude on WGS 84. */
type Place = [lon: number, lat: number]

/** Where a crag of the invented island lies: its mark, and the top of its face from one end to the other. */
interface CragPlace {
  area: 'Keld Cliffs' | 'Harrow Fell'
  lon: number
  lat: number
  /** Five places along the edge, the fall on the right hand, so that climbs can stand where rock is. */
  face: Place[]
}

/**
 * The crags of the demo, each on a cliff, quarry face or edge of the ground that the build draws (a test measures
 * it). Along Keld Cliffs from west to east, then Harrow Fell from west to east.
 */
export const cragPlaces = {
  'Storm Beach': {
    area: 'Keld Cliffs',
    lon: -28.631966,
    lat: 33.378866,
    face: [
      [-28.632739, 33.379233],
      [-28.632324, 33.378966],
      [-28.631775, 33.378797],
      [-28.631281, 33.378541],
      [-28.630807, 33.378223],
    ],
  },
  'The Long Ledge': {
    area: 'Keld Cliffs',
    lon: -28.619788,
    lat: 33.378241,
    face: [
      [-28.620921, 33.378084],
      [-28.620435, 33.378397],
      [-28.619831, 33.378274],
      [-28.619308, 33.378007],
      [-28.618491, 33.378119],
    ],
  },
  'Gannet Wall': {
    area: 'Keld Cliffs',
    lon: -28.60649,
    lat: 33.376844,
    face: [
      [-28.60786, 33.376951],
      [-28.607135, 33.376831],
      [-28.606571, 33.376879],
      [-28.605845, 33.376701],
      [-28.605137, 33.376638],
    ],
  },
  'Kittiwake Zawn': {
    area: 'Keld Cliffs',
    lon: -28.594658,
    lat: 33.386743,
    face: [
      [-28.595768, 33.387102],
      [-28.595122, 33.387161],
      [-28.594658, 33.386743],
      [-28.594261, 33.386217],
      [-28.593864, 33.385759],
    ],
  },
  'Selkie Slabs': {
    area: 'Keld Cliffs',
    lon: -28.577433,
    lat: 33.381919,
    face: [
      [-28.578757, 33.381621],
      [-28.578055, 33.381901],
      [-28.577415, 33.381919],
      [-28.57658, 33.381928],
      [-28.576052, 33.381789],
    ],
  },
  'Auk Buttress': {
    area: 'Keld Cliffs',
    lon: -28.56161,
    lat: 33.381249,
    face: [
      [-28.562746, 33.380826],
      [-28.562284, 33.381248],
      [-28.56157, 33.38123],
      [-28.560999, 33.380918],
      [-28.560458, 33.380616],
    ],
  },
  'Raven Quarry': {
    area: 'Harrow Fell',
    lon: -28.618097,
    lat: 33.413253,
    face: [
      [-28.618951, 33.412853],
      [-28.618479, 33.413077],
      [-28.618097, 33.413253],
      [-28.617508, 33.413245],
      [-28.617181, 33.413147],
    ],
  },
  'Slate Stair': {
    area: 'Harrow Fell',
    lon: -28.603702,
    lat: 33.411484,
    face: [
      [-28.604548, 33.411481],
      [-28.604086, 33.411421],
      [-28.603702, 33.411484],
      [-28.603227, 33.411508],
      [-28.602701, 33.411418],
    ],
  },
  'Whetstone Edge': {
    area: 'Harrow Fell',
    lon: -28.584723,
    lat: 33.413592,
    face: [
      [-28.586395, 33.413338],
      [-28.585287, 33.413457],
      [-28.584723, 33.413592],
      [-28.583574, 33.413693],
      [-28.582989, 33.41366],
    ],
  },
} satisfies Record<string, CragPlace>
