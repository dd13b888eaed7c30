import { describe, expect, it } from 'vitest'
import { numbersFrom, pictureOf, type Pose, type Sight } from '../../helpers/cameraPose'
import { payloadOf } from '../../helpers/labelPdf'
import { readSymbols } from '../../helpers/readSymbols'

const CODE = payloadOf('7K3M9Q2TX')

/** A hard picture: far away, oily, a little out of focus. */
const HARD: Sight = { width: 1280, height: 720, pixelsPerModule: 3, ink: 80, paper: 140, blurModules: 0.3, noise: 2, arcShare: 0 }

const POSES = 20
const MOST_MS = 2000
/** A camera gives a picture every 33 ms, however fast the decoder is. */
const FRAME_MS = 33

/** How long it takes until a picture of this pose is read, the hand never quite still; null where it takes over two seconds. */
async function timeToRead(pose: Pose, sight: Sight, random: () => number): Promise<number | null> {
  for (let elapsed = 0; elapsed < MOST_MS;) {
    const shaken = { ...pose, roll: pose.roll + random() - 0.5, yaw: pose.yaw + random() - 0.5, pitch: pose.pitch + random() - 0.5, x: pose.x + 4 * random(), y: pose.y + 4 * random() }
    const levels = pictureOf(CODE, shaken, sight, random)
    // Of the processor, not of the clock: other work on the machine is not the decoder's.
    const began = process.cpuUsage()
    const found = await readSymbols(sight.width, sight.height, (x, y) => levels[y * sight.width + x]!)
    const { user, system } = process.cpuUsage(began)
    elapsed += Math.max(FRAME_MS, (user + system) / 1000)
    if (found.includes(CODE) && elapsed <= MOST_MS) return elapsed
  }
  return null
}

function anyPose(random: () => number): Pose {
  return { yaw: 60 * random() - 30, pitch: 60 * random() - 30, roll: 360 * random(), x: 300 * random() - 150, y: 200 * random() - 100 }
}

describe('the decoder of the scan screen, three pixels a module, greys 80 on 140, blurred by 0.3 of a module', () => {
  it.each([
    ['flat, tilted within 30 degrees both ways', 0, anyPose],
    ['flat, tilted by the full 30 degrees both ways', 0, (random: () => number) => ({ ...anyPose(random), yaw: random() < 0.5 ? 30 : -30, pitch: random() < 0.5 ? 30 : -30 })],
    ['round the narrowest cylinder that its size is printed for, tilted within 30 degrees both ways', 0.14, anyPose],
  ])(`reads at least 18 of ${POSES} poses within two seconds: %s`, async (name, arcShare, poseOf) => {
    const random = numbersFrom(11)
    const times: (number | null)[] = []
    for (let pose = 0; pose < POSES; pose++) times.push(await timeToRead(poseOf(random), { ...HARD, arcShare }, random))
    const read = times.filter(time => time !== null).sort((a, b) => a - b)
    console.info(`${name}: ${read.length} of ${POSES}; median ${Math.round(read[Math.floor(read.length / 2)] ?? NaN)} ms, slowest ${Math.round(read.at(-1) ?? NaN)} ms`)
    expect(read.length).toBeGreaterThanOrEqual(18)
  }, 600_000)

  it('reads none with the contrast of a label under oil, so that the test can fail', async () => {
    const random = numbersFrom(11)
    const pose = { ...anyPose(random), yaw: 0, pitch: 0 }
    const levels = pictureOf(CODE, pose, { ...HARD, ink: 118, paper: 122 }, random)
    expect(await readSymbols(HARD.width, HARD.height, (x, y) => levels[y * HARD.width + x]!)).toEqual([])
  }, 60_000)
})
