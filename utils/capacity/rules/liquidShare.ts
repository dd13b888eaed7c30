import { hasLiquidAt, liquidDensityAt } from '../../refrigerant/saturation'
import { derateFactor, liquidDensityFactor, shareFactor, volumeFactor } from './factors'
import type { RuleFigure, RuleInput } from './ruleInput'
import { temperatureText } from './sumText'

/** A share of the volume as liquid at a temperature: what the rules that fix such a temperature have in common. */
export type LiquidShare = { shareThousandths: number, tC: number, source: string }

/** The weight of liquid that takes a share of a cylinder's volume at a temperature, or none where there is no liquid then. */
export function liquidShareOfVolume(input: RuleInput, share: LiquidShare): RuleFigure {
  const { fluid, volumeLitres } = input
  if (!hasLiquidAt(fluid, share.tC)) {
    return {
      exactGrams: null,
      because: `${fluid.designation} has no liquid at ${temperatureText(share.tC)}, or no figure for it`,
      source: share.source,
    }
  }
  const density = liquidDensityAt(fluid, share.tC)
  const factors = [shareFactor(share.shareThousandths), volumeFactor(volumeLitres), liquidDensityFactor(fluid, share.tC, density)]
  if (fluid.derate !== undefined) factors.push(derateFactor(fluid.derate))
  return {
    exactGrams: volumeLitres * density * share.shareThousandths / 1000,
    factors,
    source: `${share.source}; density: ${fluid.source}`,
  }
}
