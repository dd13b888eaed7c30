import { volumeLitres } from '../../capacity/rules/ruleInput'
import { celsiusFromFahrenheit } from '../../quantity/temperature'
import { exactGrams, type MassReading } from '../../quantity/mass'
import { scaleAccuracyGrams } from '../../quantity/scale'
import { hasLiquidAt, saturationAt } from '../../refrigerant/saturation'
import { testedFull } from '../findings/retest'
import { belowTare, tareAboveStamp } from '../findings/weight'
import { becomeNothing } from './contents'
import { changeNet } from './ledger'
import { restOnNothing } from './scaleReading'
import { holdBack, lift } from './standing'
import { isTareLoss } from './tareLoss'
import { isConfirmed, type Turn } from './turn'

/** A requalifier has tested the cylinder. */
export function retested(turn: Turn<'retested'>): void {
  const { state, event } = turn
  const { method, result, month, rin, suffix, newTare } = event.details
  if (method !== 'visual') fillWithWater(turn)
  if (result === 'passed') {
    state.marks.push({ month, method, ...(rin === undefined ? {} : { rin }), ...(suffix === undefined ? {} : { suffix }), enteredAt: event.effectiveAt })
    // An outside look tells nothing of the strength of steel that failed or was hurt (49 CFR 180.205(d), (h)).
    if (method !== 'visual') lift(turn, 'rejected', 'damaged', 'tare-loss')
  }
  if (result === 'rejected') holdBack(turn, 'rejected')
  if (result === 'condemned') state.condemnedAt ??= event.effectiveAt
  if (state.away?.at === 'at-test') state.away = null
  if (newTare) takeTare(turn, newTare)
}

// A volumetric or a proof pressure test is made with water, whatever its result.
function fillWithWater(turn: Turn<'retested'>): void {
  const { contents } = turn.state
  if (!contents.nothingInIt && contents.netGrams !== null && contents.netGrams > vapourHeelGrams(turn)) {
    turn.findings.push(testedFull(contents.netGrams))
  }
  changeNet(turn, 0, 'emptied-loss')
  becomeNothing(turn, { evacuated: false })
  restOnNothing(turn)
  holdBack(turn, 'wet')
}

const HEEL_C = celsiusFromFahrenheit(77)

/** What vapour alone leaves in a cylinder at 77 F; where that is not known, what the scale cannot tell from nothing. */
function vapourHeelGrams({ state, context }: Turn): number {
  const { stamp, contents } = state
  const refrigerant = contents.refrigerant === null ? undefined : context.catalogue.refrigerants.get(contents.refrigerant)
  if (!stamp?.waterCapacity || !refrigerant || !hasLiquidAt(refrigerant, HEEL_C)) return contents.uncertaintyGrams ?? 0
  return volumeLitres(stamp.waterCapacity) * saturationAt(refrigerant, HEEL_C).vapourDensity
}

// As far above the stamp nothing but a slip or a fitting explains it: our threshold.
const TARE_GAIN_RATIO = 1.05

// Keeps a product of decimals from landing a hair below the edge.
const FLOAT_NOISE_GRAMS = 1e-6

function takeTare(turn: Turn<'retested'>, newTare: MassReading): void {
  const { state, event } = turn
  const grams = exactGrams(newTare)
  const before = state.tare
  state.tare = { exactGrams: grams, since: event.effectiveAt, isWeighedAnew: true }
  const stamped = state.stamp?.tareWeight
  const isNews = before === null || grams < before.exactGrams
  if (stamped && isNews && isTareLoss(grams, exactGrams(stamped))) holdBack(turn, 'tare-loss')
  const isWithValve = state.stamp?.tareIncludesValve !== false
  if (stamped && isWithValve && grams > exactGrams(stamped) * TARE_GAIN_RATIO + FLOAT_NOISE_GRAMS) {
    turn.findings.push(tareAboveStamp(grams - exactGrams(stamped), isConfirmed(turn, 'weigh-again')))
  }
  judgeGrossAnew(turn, grams)
}

function judgeGrossAnew(turn: Turn<'retested'>, tareGrams: number): void {
  const { contents } = turn.state
  if (contents.grossGrams === null || contents.nothingInIt) return
  const net = contents.grossGrams - Math.round(tareGrams)
  const accuracy = contents.uncertaintyGrams ?? scaleAccuracyGrams(contents.grossGrams)
  if (net < -accuracy) turn.findings.push(belowTare(-net, isConfirmed(turn, 'weigh-again')))
  // No other reading than the net rested on before: its uncertainty counts once.
  changeNet(turn, net < -accuracy ? null : Math.max(0, net), 'tare-change', 0)
  if (contents.netGrams !== null) contents.lastKnownNetGrams = Math.max(0, contents.grossGrams - tareGrams)
  contents.basis = contents.netGrams === null ? 'unknown' : 'weighed'
  contents.uncertaintyGrams = contents.netGrams === null ? null : accuracy
  contents.asOf = turn.event.effectiveAt
}
