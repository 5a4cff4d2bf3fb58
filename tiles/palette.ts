/** Colours of the ground: quiet, so that the marks are the only strong things on the sheet. */
export interface GroundPalette {
  land: string
  heath: string
  forest: string
  beach: string
  quarry: string
  shade: string
  light: string
  shadeStrength: number
  lightStrength: number
  contour: string
  contourStrength: number
  indexStrength: number
  contourText: string
  sea: string
  waterline: string
  coast: string
  beck: string
  cliff: string
  road: string
  roadEdge: string
  path: string
  building: string
  placeText: string
  waterText: string
  landHalo: string
  seaHalo: string
}

export const groundPalettes: Record<'light' | 'dark', GroundPalette> = {
  light: {
    land: '#e9e6d8',
    heath: '#e3dccb',
    forest: '#dbdfc9',
    beach: '#efe7cd',
    quarry: '#d9d6cd',
    shade: '#2b3a33',
    light: '#fffdf4',
    shadeStrength: 0.028,
    lightStrength: 0.085,
    contour: '#9c8b6b',
    contourStrength: 0.52,
    indexStrength: 0.78,
    contourText: '#7d6c4c',
    sea: '#cfdcdc',
    waterline: '#8fa9ab',
    coast: '#4d5b5c',
    beck: '#8aa6aa',
    cliff: '#4d5b5c',
    road: '#ffffff',
    roadEdge: '#b3a78e',
    path: '#94866a',
    building: '#a89f8c',
    placeText: '#5a5342',
    waterText: '#3f5b66',
    landHalo: '#e9e6d8',
    seaHalo: '#cfdcdc',
  },
  dark: {
    land: '#1d2728',
    heath: '#212825',
    forest: '#1b2b27',
    beach: '#2b2e29',
    quarry: '#272e31',
    shade: '#05090a',
    light: '#c9d6cf',
    shadeStrength: 0.085,
    lightStrength: 0.02,
    contour: '#8a7c62',
    contourStrength: 0.42,
    indexStrength: 0.72,
    contourText: '#a39371',
    sea: '#10191d',
    waterline: '#35505a',
    coast: '#8a989a',
    beck: '#45626c',
    cliff: '#8a989a',
    road: '#626b69',
    roadEdge: '#11191a',
    path: '#7d7563',
    building: '#4d5250',
    placeText: '#b9b19d',
    waterText: '#8fb0bb',
    landHalo: '#1d2728',
    seaHalo: '#10191d',
  },
}
