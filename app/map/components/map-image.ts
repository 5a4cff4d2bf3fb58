import { findMapImage, type MapTheme, type MarkState, markInks, markShapes } from '../mark'

const markSize = 18
const discRadius = 11
const cornerReach = 17

/** The picture the map asked for by name, drawn at `ratio` device pixels to one; null for a name not ours. */
export function drawMapImage(name: string, ratio: number): ImageData | null {
  const wanted = findMapImage(name)
  if (!wanted) return null
  return wanted.kind === 'mark'
    ? drawMark(wanted.state, wanted.theme, ratio)
    : drawCorners(wanted.kind === 'selected', wanted.theme, ratio)
}

function canvasOf(size: number, ratio: number): CanvasRenderingContext2D {
  const canvas = document.createElement('canvas')
  canvas.width = canvas.height = Math.round(size * ratio)
  const pen = canvas.getContext('2d')!
  pen.scale(ratio, ratio)
  return pen
}

const imageOf = ({ canvas }: CanvasRenderingContext2D, pen: CanvasRenderingContext2D) =>
  pen.getImageData(0, 0, canvas.width, canvas.height)

function drawMark(state: MarkState, theme: MapTheme, ratio: number): ImageData {
  const inks = markInks[theme]
  const size = 2 * discRadius + 2
  const pen = canvasOf(size, ratio)
  pen.fillStyle = inks.disc
  pen.beginPath()
  pen.arc(size / 2, size / 2, discRadius, 0, 2 * Math.PI)
  pen.fill()
  pen.translate((size - markSize) / 2, (size - markSize) / 2)
  pen.scale(markSize / 16, markSize / 16)
  for (const { path, ink, stroke, dash } of markShapes[state]) {
    const shape = new Path2D(path)
    pen.fillStyle = pen.strokeStyle = inks[ink]
    pen.setLineDash(dash ? [dash[0], dash[1]] : [])
    pen.lineDashOffset = dash?.[2] ?? 0
    if (stroke) {
      pen.lineWidth = stroke
      pen.stroke(shape)
    } else pen.fill(shape)
  }
  return imageOf(pen, pen)
}

function drawCorners(strong: boolean, theme: MapTheme, ratio: number): ImageData {
  const size = 2 * cornerReach + 4
  const pen = canvasOf(size, ratio)
  pen.translate(size / 2, size / 2)
  const lines = () => {
    for (const [x, y] of [
      [-1, -1],
      [1, -1],
      [-1, 1],
      [1, 1],
    ] as const) {
      pen.beginPath()
      pen.moveTo(x * cornerReach, y * (cornerReach - 6))
      pen.lineTo(x * cornerReach, y * cornerReach)
      pen.lineTo(x * (cornerReach - 6), y * cornerReach)
      pen.stroke()
    }
  }
  pen.globalAlpha = 0.75
  pen.strokeStyle = markInks[theme].disc
  pen.lineWidth = strong ? 4 : 3
  lines()
  pen.globalAlpha = 1
  pen.strokeStyle = strong ? markInks[theme].slate : markInks[theme].stone
  pen.lineWidth = strong ? 2 : 1.5
  lines()
  return imageOf(pen, pen)
}
