import { labelSymbol, QUIET_MODULES } from '../../utils/label/symbol'

/** How a phone is held before a label, what it sees of ink and paper, and how sharp. */
export interface Pose {
  /** In degrees. */
  yaw: number
  pitch: number
  roll: number
  /** Where the symbol's middle lies in the picture, in pixels from the picture's. */
  x: number
  y: number
}

export interface Sight {
  width: number
  height: number
  /** Seen straight on. */
  pixelsPerModule: number
  ink: number
  paper: number
  /** Standard deviation of the blur, in modules. */
  blurModules: number
  /** Of each pixel, in grey levels. */
  noise: number
  /** Side of the symbol over the diameter of the cylinder; 0 is flat. */
  arcShare: number
}

/** Beyond the label: bare steel. */
const STEEL = 110
/** The width of a picture over the distance at which it is so wide: 65 degrees of view. */
const FOCAL_WIDTHS = 0.5 / Math.tan(65 / 2 * Math.PI / 180)
/** Rays along each side of a pixel. */
const RAYS = 3

/** Numbers from 0 to 1 that look random and are the same each time. */
export function numbersFrom(seed: number): () => number {
  let state = seed
  return () => {
    state = state + 0x6D2B79F5 | 0
    let mixed = Math.imul(state ^ state >>> 15, state | 1)
    mixed = mixed + Math.imul(mixed ^ mixed >>> 7, mixed | 61) ^ mixed
    return ((mixed ^ mixed >>> 14) >>> 0) / 4_294_967_296
  }
}

/** Grey levels, row by row, of what a pinhole camera sees of the label that carries this payload. */
export function pictureOf(payload: string, pose: Pose, sight: Sight, random: () => number): Float32Array {
  const { width, height, pixelsPerModule } = sight
  const symbol = labelSymbol(payload)
  const half = symbol.size / 2
  const radius = sight.arcShare === 0 ? Infinity : symbol.size / sight.arcShare / 2
  const focal = FOCAL_WIDTHS * width
  // Lengths in modules; the symbol's middle lies this far before the camera.
  const distance = focal / pixelsPerModule
  const turn = turned(pose)
  const eye = turn([-pose.x / pixelsPerModule, -pose.y / pixelsPerModule, -distance])

  function brightness(pixelX: number, pixelY: number): number {
    const [dx, dy, dz] = turn([(pixelX - width / 2) / focal, (pixelY - height / 2) / focal, 1])
    const at = hit(eye, [dx, dy, dz], radius)
    if (!at) return STEEL
    const [u, v] = at
    if (Math.abs(u) > half + QUIET_MODULES || Math.abs(v) > half + QUIET_MODULES) return STEEL
    return symbol.isDark(Math.floor(u + half), Math.floor(v + half)) ? sight.ink : sight.paper
  }

  const reach = (half + QUIET_MODULES + 3) * pixelsPerModule * 1.6
  const sharp = new Float32Array(width * height).fill(STEEL)
  const [left, top] = [Math.max(0, Math.floor(width / 2 + pose.x - reach)), Math.max(0, Math.floor(height / 2 + pose.y - reach))]
  for (let y = top; y < Math.min(height, top + 2 * reach); y++) {
    for (let x = left; x < Math.min(width, left + 2 * reach); x++) {
      let sum = 0
      for (let ray = 0; ray < RAYS * RAYS; ray++) sum += brightness(x + (ray % RAYS + 0.5) / RAYS, y + (Math.floor(ray / RAYS) + 0.5) / RAYS)
      sharp[y * width + x] = sum / RAYS / RAYS
    }
  }
  const seen = blurred(blurred(sharp, width, 1, sight.blurModules * pixelsPerModule), width, width, sight.blurModules * pixelsPerModule)
  return seen.map(level => level + sight.noise * (random() + random() + random() + random() - 2) * Math.sqrt(3))
}

type Vector = readonly [number, number, number]

/** From the camera's axes to the label's: roll about the line of sight, then pitch, then yaw. */
function turned({ yaw, pitch, roll }: Pose): (vector: Vector) => Vector {
  const [a, b, c] = [yaw, pitch, roll].map(degrees => degrees * Math.PI / 180) as [number, number, number]
  return ([x, y, z]) => {
    const [x1, y1] = [x * Math.cos(c) + y * Math.sin(c), y * Math.cos(c) - x * Math.sin(c)]
    const [y2, z2] = [y1 * Math.cos(b) + z * Math.sin(b), z * Math.cos(b) - y1 * Math.sin(b)]
    return [x1 * Math.cos(a) - z2 * Math.sin(a), y2, z2 * Math.cos(a) + x1 * Math.sin(a)]
  }
}

/** Where a ray meets the label: along its width, round the cylinder, and along its height. */
function hit([ox, oy, oz]: Vector, [dx, dy, dz]: Vector, radius: number): [number, number] | null {
  if (radius === Infinity) return [ox - oz / dz * dx, oy - oz / dz * dy]
  const [a, b, c] = [dx * dx + dz * dz, 2 * (ox * dx + (oz - radius) * dz), ox * ox + (oz - radius) ** 2 - radius * radius]
  const inside = b * b - 4 * a * c
  if (inside < 0) return null
  const t = (-b - Math.sqrt(inside)) / 2 / a
  return [radius * Math.atan2(ox + t * dx, radius - oz - t * dz), oy + t * dy]
}

/** Along rows where `step` is 1, along columns where it is the width. */
function blurred(levels: Float32Array, width: number, step: number, sigma: number): Float32Array {
  const reach = Math.ceil(sigma * 3)
  const weights = Array.from({ length: 2 * reach + 1 }, (_, index) => Math.exp(-((index - reach) ** 2) / 2 / sigma ** 2))
  const total = weights.reduce((sum, weight) => sum + weight, 0)
  const last = levels.length / width - 1
  return levels.map((own, at) => {
    const place = step === 1 ? at % width : Math.floor(at / width)
    const end = step === 1 ? width - 1 : last
    let sum = 0
    for (let offset = -reach; offset <= reach; offset++) {
      sum += weights[offset + reach]! * (place + offset < 0 || place + offset > end ? own : levels[at + offset * step]!)
    }
    return sum / total
  })
}
