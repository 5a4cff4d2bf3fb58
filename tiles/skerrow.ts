import { type Metres, traced } from './shape'

/** The Isle of Skerrow is invented. This file is its survey: what the ground build turns into a sheet. */
export const seed = 20261

/** Middle of the sheet, in an empty part of the ocean. */
export const middle = { lon: -28.6, lat: 33.4 }

/** The sheet the rasters cover, metres from the middle. */
export const sheet = { west: -6600, south: -4800, east: 6600, north: 5000 }

/** Where the map may be looked at closely, degrees. */
export const seaBox = { west: -30.1, south: 32.4, east: -27.1, north: 34.4 }

/** The coast, anticlockwise from the western point; the noise of the build roughens it. */
export const coast: Metres[] = traced(`
  -4700,350 -4480,-350 -4620,-1050 -4350,-1650 -4480,-2150 -4050,-2520 -3700,-2230 -3380,-2080
  -3020,-2300 -2780,-2720 -2380,-2790 -1990,-2480 -1640,-2420 -1440,-1980 -1180,-2020 -980,-2450
  -560,-2620 -180,-2540 120,-2180 290,-1680 430,-1430 560,-1700 640,-2160 980,-2560 1400,-2640
  1760,-2330 2080,-2090 2430,-2260 2700,-2620 3080,-2640 3280,-2280 3540,-2080 3890,-2220
  4200,-2100 4520,-1500 4430,-820 4700,-200 4560,420 4060,820 3960,1250 4330,1660 4150,2250
  3560,2660 2900,2600 2300,2980 1480,3180 700,2960 -20,3180 -820,3010 -1500,3140 -2180,2790
  -2740,2860 -3260,2430 -3880,2120 -3960,1600 -3690,1240 -4260,900
`)

/** Places where the land comes down to the sea gently, with the reach of each in metres. */
export const lowShores: { at: Metres; reach: number }[] = [
  { at: [-3380, -2080], reach: 520 },
  { at: [-1310, -1980], reach: 260 },
  { at: [4560, 300], reach: 1100 },
]

/** Places outside the south coast where it is cliff all the same. */
export const northCliffs: { at: Metres; reach: number }[] = [
  { at: [-4050, 2100], reach: 700 },
  { at: [2500, 2950], reach: 900 },
]

/** Hills: where, how high, and the reach along and across, turned anticlockwise. */
export const hills: { at: Metres; high: number; reach: Metres; turn: number }[] = [
  { at: [-950, 1620], high: 205, reach: [1050, 620], turn: 0.14 },
  { at: [650, 1900], high: 150, reach: [1150, 560], turn: -0.1 },
  { at: [-2500, 1350], high: 105, reach: [760, 560], turn: 0.5 },
  { at: [2350, 1500], high: 88, reach: [900, 620], turn: -0.35 },
  { at: [-3300, -600], high: 46, reach: [700, 620], turn: 0.2 },
  { at: [1400, -850], high: 48, reach: [1000, 560], turn: -0.2 },
  { at: [3350, -1150], high: 40, reach: [720, 620], turn: 0 },
  { at: [-1000, -1250], high: 34, reach: [760, 460], turn: 0.3 },
]

/** Streams from source to mouth; the valleys follow them. */
export const streams: { name: string; line: Metres[] }[] = [
  {
    name: 'Keld Beck',
    line: traced('-1480,1020 -1700,560 -1640,80 -2060,-420 -2380,-980 -2860,-1400 -3180,-1780 -3400,-2120'),
  },
  {
    name: 'Cove Gill',
    line: traced('-420,760 -260,240 -520,-300 -820,-760 -1240,-1300 -1330,-2020'),
  },
  {
    name: 'Farn Water',
    line: traced('560,1260 1000,760 1640,460 2240,520 2860,700 3380,880 4060,1000'),
  },
  {
    name: 'Skarth Burn',
    line: traced('-1750,1830 -1980,2220 -2120,2560 -2180,2840'),
  },
  {
    name: 'Mire Sike',
    line: traced('-2900,760 -3340,640 -3800,760 -4300,620 -4640,620'),
  },
]

export const tarn = { name: 'Whin Tarn', at: [2060, -160] as Metres, reach: [190, 120] as Metres, turn: 0.6 }

/** Slate quarries: an oval pit, open to the side `mouth` (angle, radians, anticlockwise from east before turning). */
export const quarries: { name: string; at: Metres; reach: Metres; turn: number; mouth: number }[] = [
  { name: 'Raven Quarry', at: [-1700, 1330], reach: [190, 130], turn: 0.3, mouth: -1.7 },
  { name: 'Slate Stair', at: [-350, 1180], reach: [150, 105], turn: -0.2, mouth: -1.4 },
]

/** A gritstone edge facing south, west to east. */
export const edge: { name: string; line: Metres[] } = {
  name: 'Whetstone Edge',
  line: traced('880,1450 1090,1500 1290,1470 1500,1530 1720,1490 1900,1400'),
}

export interface Way {
  kind: 'tertiary' | 'unclassified' | 'track' | 'path'
  line: Metres[]
}

/** Roads and paths, coarse; the coast path is drawn by the build along the cliff tops. */
export const ways: Way[] = [
  {
    kind: 'tertiary',
    line: traced(`
  3900,1060 3350,560 2700,260 1900,220 1150,-40 420,-480 -180,-560 -700,-330 -1300,-180 -1900,-560
  -2420,-1060 -3000,-1560 -3260,-1850
`),
  },
  {
    kind: 'unclassified',
    line: traced('-1300,-180 -2000,240 -2700,420 -3250,980 -3000,1720 -2480,2300 -1950,2560'),
  },
  {
    kind: 'unclassified',
    line: traced('1150,-40 1500,-620 2300,-980 3050,-1300 3550,-1500'),
  },
  {
    kind: 'unclassified',
    line: traced('3900,1060 3640,1500 3150,1950 2450,2280 1600,2620'),
  },
  {
    kind: 'track',
    line: traced('-1300,-180 -1180,330 -1420,760 -1640,1130'),
  },
  {
    kind: 'track',
    line: traced('-1210,420 -760,760 -420,1000 -370,1090'),
  },
  {
    kind: 'track',
    line: traced('-180,-560 -420,-1040 -620,-1540 -560,-2230'),
  },
  {
    kind: 'path',
    line: traced('1900,220 1780,700 1480,1120 1420,1390'),
  },
  {
    kind: 'path',
    line: traced('-420,1000 -600,1180 -480,1390 -90,1540 250,1880 900,2060 1600,2620'),
  },
  {
    kind: 'path',
    line: traced('-90,1540 -620,1690 -1000,1640'),
  },
  {
    kind: 'path',
    line: traced('420,-480 640,-960 760,-1500 820,-2140'),
  },
  {
    kind: 'path',
    line: traced('2300,-980 2180,-1480 2080,-1900'),
  },
]

export interface Named {
  name: string
  at: Metres
}

/** A place where people live, by Shortbread's kind; its name stands at `label`, clear of its roads. */
export interface Settlement extends Named {
  kind: 'village' | 'hamlet'
  label: Metres
  population: number
  houses: number
}

export const settlements: Settlement[] = [
  { kind: 'village', name: 'Farnholm', at: [3720, 930], label: [3260, 1120], population: 410, houses: 70 },
  { kind: 'village', name: 'Upper Keld', at: [-420, -470], label: [130, -330], population: 160, houses: 34 },
  {
    kind: 'hamlet',
    name: 'Nether Keld',
    at: [-2820, -1430],
    label: [-3300, -1260],
    population: 60,
    houses: 16,
  },
  { kind: 'hamlet', name: 'Skarth', at: [-2160, 2480], label: [-2420, 2500], population: 45, houses: 12 },
  { kind: 'hamlet', name: 'Auksey', at: [3330, -1410], label: [3560, -1220], population: 30, houses: 10 },
]

export const fells: Named[] = [
  { name: 'Harrow Fell', at: [-950, 1620] },
  { name: 'Lang Rigg', at: [640, 1930] },
  { name: 'Whin Howe', at: [2350, 1480] },
]

export const seaNames: (Named & { size: 'sound' | 'bay' })[] = [
  { size: 'sound', name: 'Keld Sound', at: [-1700, -3330] },
  { size: 'sound', name: 'Harrow Deep', at: [1200, 3900] },
  { size: 'bay', name: 'Farn Haven', at: [4620, 1180] },
]
