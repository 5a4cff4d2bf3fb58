/** A repeatable stream of numbers in [0, 1) from a 32-bit seed (mulberry32). */
export function seeded(seed: number): () => number {
  let state = seed >>> 0
  return () => {
    state = (state + 0x6d2b79f5) >>> 0
    let t = Math.imul(state ^ (state >>> 15), 1 | state)
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296
  }
}

/** A smooth random surface over the plane: about -1 to 1, one hill or hollow per unit of length. */
export type Noise = (x: number, y: number) => number

const fade = (t: number) => t * t * t * (t * (t * 6 - 15) + 10)
const mix = (a: number, b: number, t: number) => a + (b - a) * t

/** Gradient noise with 256 shuffled directions; the same for the same seed. */
export function gradientNoise(seed: number): Noise {
  const random = seeded(seed)
  const order = Uint8Array.from({ length: 256 }, (_, i) => i)
  for (let i = 255; i > 0; i--) {
    const j = Math.floor(random() * (i + 1))
    const held = order[i]!
    order[i] = order[j]!
    order[j] = held
  }
  const across = Float64Array.from({ length: 256 }, (_, i) => Math.cos((i / 256) * 2 * Math.PI))
  const up = Float64Array.from({ length: 256 }, (_, i) => Math.sin((i / 256) * 2 * Math.PI))
  const slope = (ix: number, iy: number, dx: number, dy: number) => {
    const at = order[(order[ix & 255]! + iy) & 255]!
    return across[at]! * dx + up[at]! * dy
  }
  return (x, y) => {
    const ix = Math.floor(x)
    const iy = Math.floor(y)
    const dx = x - ix
    const dy = y - iy
    const u = fade(dx)
    const low = mix(slope(ix, iy, dx, dy), slope(ix + 1, iy, dx - 1, dy), u)
    const high = mix(slope(ix, iy + 1, dx, dy - 1), slope(ix + 1, iy + 1, dx - 1, dy - 1), u)
    return mix(low, high, fade(dy)) * 1.5
  }
}

/** Noise of several wavelengths added, each half as long and `falloff` times as strong as the one before. */
export function layered(noise: Noise, octaves: number, falloff = 0.5): Noise {
  return (x, y) => {
    let sum = 0
    let strength = 1
    for (let octave = 0; octave < octaves; octave++) {
      const scale = 2 ** octave
      sum += strength * noise(x * scale + octave * 17.3, y * scale - octave * 31.7)
      strength *= falloff
    }
    return sum
  }
}
