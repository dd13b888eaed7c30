// What a full capacity answer costs over one look-up of saturation, in one build and one run: `npm run bench:capacity`.
import { mkdtemp, rm, writeFile } from 'node:fs/promises'
import { availableParallelism, cpus, tmpdir } from 'node:os'
import { join } from 'node:path'
import process from 'node:process'
import { fileURLToPath, pathToFileURL } from 'node:url'
import { build } from 'vite'

const BOUND = 20
const ROUNDS = 301
const WARM_UP_ROUNDS = 60
const LOOK_UPS_A_ROUND = 2000
const ANSWERS_A_ROUND = 200

const { CATALOGUE, DEFAULT_FILL_POLICY, capacityInWords, capacityOf, initialState, saturationAt } = await built('capacityParts.mjs')

/** A file of this folder bundled as for the server: a loader that keeps modules apart would time its own wrappers. */
async function built(file) {
  const bundle = await build({
    configFile: false, logLevel: 'warn', root: fileURLToPath(new URL('.', import.meta.url)),
    build: { ssr: file, write: false, minify: false, target: 'node20' },
  })
  const folder = await mkdtemp(join(tmpdir(), 'collarbook-bench-'))
  try {
    const path = join(folder, 'bundle.mjs')
    await writeFile(path, bundle.output[0].code)
    return await import(pathToFileURL(path).href)
  }
  finally {
    await rm(folder, { recursive: true })
  }
}

// Each of the kinds that are reckoned differently: heavy and light liquids, a named gas, a hydrocarbon, a blend with glide, gases when hot.
const REFRIGERANTS = ['R-22', 'R-410A', 'R-32', 'R-404A', 'R-407C', 'R-134a', 'R-290', 'R-454B', 'R-23']
const TEMPERATURES_C = [-37.5, -12.2, 4.4, 9.9, 14.9]

const lookUps = REFRIGERANTS.flatMap(name => TEMPERATURES_C.map(tC => ({ refrigerant: CATALOGUE.refrigerants.get(name), tC })))
const states = REFRIGERANTS.map(filledWith)
const context = { policyNow: DEFAULT_FILL_POLICY, catalogue: CATALOGUE }
const retest = { lastMonth: '2024-03', intervalMonths: 60, dueMonth: '2029-03', state: 'in-date', basis: '' }

/** A 50 lb cylinder, two thirds full. */
function filledWith(refrigerant) {
  const state = initialState('bench')
  return {
    ...state,
    stamp: {
      serial: 'A1001', spec: 'DOT-4BA', servicePressurePsig: 400, tareWeight: { unit: 'lb', value: 27.5 },
      waterCapacity: { unit: 'lb', value: 47.6 }, madeMonth: '2022-03', flammableMarked: true,
    },
    tare: { exactGrams: 12_473.79, since: 0, isWeighedAnew: false },
    contents: { ...state.contents, refrigerant, condition: 'clean', nothingInIt: false, netGrams: 11_000, lastKnownNetGrams: 11_000 },
  }
}

// What is computed is added up, so that no engine may leave it out.
let kept = 0

/** The time of one of many runs, each on the next of what stands in a circle. Units: ns. */
function timeOne(times, circle, run) {
  const begin = process.hrtime.bigint()
  for (let i = 0; i < times; i++) kept += run(circle[i % circle.length])
  return Number(process.hrtime.bigint() - begin) / times
}

function lookUpOf({ refrigerant, tC }) {
  const { liquidDensity, vapourDensity, bubblePressureKPa, dewPressureKPa } = saturationAt(refrigerant, tC)
  return liquidDensity + vapourDensity + bubblePressureKPa + dewPressureKPa
}

function answerOf(state) {
  const { fillLimitGrams, terms } = capacityOf(state, retest, context)
  return (fillLimitGrams ?? 0) + terms.length
}

function wordsOf(state) {
  return capacityInWords(capacityOf(state, retest, context), state.stamp).terms.reduce((length, term) => length + term.working.length, 0)
}

function round() {
  return {
    lookUp: timeOne(LOOK_UPS_A_ROUND, lookUps, lookUpOf),
    answer: timeOne(ANSWERS_A_ROUND, states, answerOf),
    inWords: timeOne(ANSWERS_A_ROUND, states, wordsOf),
  }
}

function median(values) {
  return [...values].sort((a, b) => a - b)[Math.floor(values.length / 2)]
}

for (let warm = 0; warm < WARM_UP_ROUNDS; warm++) round()
const rounds = Array.from({ length: ROUNDS }, round)
if (!Number.isFinite(kept)) throw new Error('The answers are no numbers')

const lookUp = median(rounds.map(times => times.lookUp))
const answer = median(rounds.map(times => times.answer))
const inWords = median(rounds.map(times => times.inWords))
const ratio = answer / lookUp
console.info(`CPU: ${cpus()[0]?.model ?? 'not known'}, ${availableParallelism()} cores; Node ${process.version}`)
console.info(`Medians of ${ROUNDS} rounds in turn`)
console.info(`One saturation look-up: ${lookUp.toFixed(0)} ns`)
console.info(`One full capacity answer: ${answer.toFixed(0)} ns`)
console.info(`Ratio: ${ratio.toFixed(1)}, at most ${BOUND}`)
console.info(`The same with its sums written out: ${inWords.toFixed(0)} ns`)
process.exitCode = ratio <= BOUND ? 0 : 1
