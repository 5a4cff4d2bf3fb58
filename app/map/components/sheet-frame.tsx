import { useEffect, useState } from 'react'
import { useMap } from 'react-map-gl/maplibre'
import type { MapTheme } from '../mark'
import {
  contourWords,
  type Frame,
  metresPerPixel,
  scaleBar,
  sheetTicks,
  type Tick,
  type Unproject,
} from '../sheet'

interface View {
  width: number
  height: number
  zoom: number
  lat: number
  unproject: Unproject
}

// Farther out the grid's zone bends too much for its figures to be read along a straight side.
const nearEnough = 8

/** The furniture of a printed sheet over the map: neatline, kilometre ticks, scale and contour interval. */
export function SheetFrame({ theme }: { theme: MapTheme }) {
  const view = useView()
  if (!view) return null
  const { width, height, zoom, lat } = view
  const wide = width >= 560
  const inset = wide ? 22 : 10
  const frame: Frame = { left: inset, top: inset, right: width - inset, bottom: height - inset }
  const perPixel = metresPerPixel(lat, zoom)
  const ticks = zoom < nearEnough ? [] : sheetTicks(view.unproject, frame, 1000 / perPixel)
  return (
    <svg className={`sheet-frame sheet-frame-${theme}`} width={width} height={height} aria-hidden="true">
      <path
        className="sheet-line"
        d={`M${frame.left + 0.5} ${frame.top + 0.5}H${frame.right - 0.5}V${frame.bottom - 0.5}H${frame.left + 0.5}Z`}
      />
      {ticks.map(tick => (
        <SheetTick key={`${tick.side}${tick.kilometres}`} tick={tick} frame={frame} named={wide} />
      ))}
      <ScaleBar frame={frame} perPixel={perPixel} zoom={zoom} />
    </svg>
  )
}

function SheetTick({ tick, frame, named }: { tick: Tick; frame: Frame; named: boolean }) {
  const { side, kilometres } = tick
  const at = Math.round(tick.at) + 0.5
  const upright = side === 'top' || side === 'bottom'
  const from = frame[side] + (side === 'right' || side === 'bottom' ? -0.5 : 0.5)
  const out = side === 'top' || side === 'left' ? -6 : 6
  return (
    <>
      <path className="sheet-line" d={upright ? `M${at} ${from}v${out}` : `M${from} ${at}h${out}`} />
      {named && side === 'top' && at > frame.left + 14 && at < frame.right - 14 ? (
        <text className="sheet-figure" x={at} y={frame.top - 10} textAnchor="middle">
          {kilometres}
        </text>
      ) : null}
      {named && side === 'left' && at > frame.top + 22 && at < frame.bottom - 22 ? (
        <text
          className="sheet-figure"
          textAnchor="middle"
          transform={`translate(${frame.left - 10} ${at}) rotate(-90)`}
        >
          {kilometres}
        </text>
      ) : null}
    </>
  )
}

function ScaleBar({ frame, perPixel, zoom }: { frame: Frame; perPixel: number; zoom: number }) {
  const { pixels, words } = scaleBar(perPixel)
  const contours = contourWords(zoom)
  const text = contours ? `${words}, ${contours}` : words
  const right = frame.right - 16
  return (
    <>
      <path className="sheet-scale" d={`M${right - pixels} ${frame.bottom - 20}H${right}`} />
      <text className="sheet-words" x={right} y={frame.bottom - 29} textAnchor="end">
        {text}
      </text>
    </>
  )
}

/** The map's view, renewed whenever it moves or is resized. */
function useView(): View | null {
  const { current: map } = useMap()
  const [view, setView] = useState<View | null>(null)
  useEffect(() => {
    if (!map) return
    const read = () => {
      const { clientWidth, clientHeight } = map.getContainer()
      setView({
        width: clientWidth,
        height: clientHeight,
        zoom: map.getZoom(),
        lat: map.getCenter().lat,
        unproject: (x, y) => {
          const { lng, lat } = map.unproject([x, y])
          return { lon: lng, lat }
        },
      })
    }
    read()
    map.on('move', read)
    map.on('resize', read)
    return () => {
      map.off('move', read)
      map.off('resize', read)
    }
  }, [map])
  return view
}
