import { exactGrams, formatMass, type MassUnit } from '../quantity/mass'
import { FLOAT_NOISE_GRAMS, grossSum, isPoisonous, type LoadedLine } from './placards'
import { unclassified } from './shippingDescription'
import { MATERIALS_OF_TRADE } from './vanLoad'

/** Whether a load may go without papers as materials of trade; in words why not, and what stays the firm's to judge. */
export interface TradeException { state: 'may' | 'may-not' | 'not-known', because: string[] }

const { eachGrams, togetherGrams, source } = MATERIALS_OF_TRADE

/**
 * Whether a load keeps within what goes as materials of trade. Whether it is that, the firm judges.
 *
 * Source: 49 CFR 173.6(a)(2), (a)(5), (d); the definition 171.8.
 */
export function tradeException(lines: readonly LoadedLine[], { carriedBy, unit }: { carriedBy: 'carrier' | 'own-vehicle' | 'not-said', unit: MassUnit }): TradeException {
  const hazardous = lines.filter(line => line.description.identification !== null)
  const heavy = hazardous.filter(({ gross }) => gross !== null && exactGrams(gross) > eachGrams + FLOAT_NOISE_GRAMS)
  const together = grossSum(hazardous)
  const against = [
    carriedBy === 'carrier' && 'It is given to a carrier: materials of trade go on the firm’s own vehicle (49 CFR 171.8).',
    hazardous.some(isPoisonous) && `What poisons by inhalation never goes as material of trade (${source}(a)(5)).`,
    heavy.length > 0 && `${heavy.length === 1 ? '1 cylinder is' : `${heavy.length} cylinders are`} above ${formatMass(eachGrams, unit, 'down')} gross (${source}(a)(2)).`,
    together > togetherGrams + FLOAT_NOISE_GRAMS && `${formatMass(together, unit, 'up')} gross together; ${formatMass(togetherGrams, unit, 'down')} is the most for all materials of trade on the vehicle (${source}(d)).`,
  ].filter(line => line !== false)
  if (against.length > 0) return { state: 'may-not', because: against }
  const notWeighed = hazardous.filter(({ gross }) => gross === null).length
  const open = [
    notWeighed > 0 && `${notWeighed === 1 ? '1 cylinder is' : `${notWeighed} cylinders are`} not weighed.`,
    unclassified(lines).length > 0 && 'Not all are classified.',
    carriedBy === 'not-said' && 'Nobody has said yet who carries it.',
  ].filter(line => line !== false)
  if (open.length > 0) return { state: 'not-known', because: open }
  return {
    state: 'may',
    because: [
      `Each is at most ${formatMass(eachGrams, unit, 'down')} gross and all together at most ${formatMass(togetherGrams, unit, 'down')}, torch gases, nitrogen, paint and fuel on the vehicle counted in (${source}(a)(2), (d)).`,
      'Whether a load to a reclaimer directly supports a business that is not transport, as 49 CFR 171.8 asks, is the firm’s judgement. The driver is told what is aboard and what 173.6 asks.',
    ],
  }
}
