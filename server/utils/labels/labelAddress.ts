import type { LabelAddress } from '~~/utils/contract/labels'
import { hostBudget } from '~~/utils/label/symbol'

/** What the symbols of labels lead to: the public address of this server, with its port where it has one. */
export function labelAddress(publicUrl: string): LabelAddress {
  return { publicUrl, ...hostBudget(new URL(publicUrl).host) }
}
