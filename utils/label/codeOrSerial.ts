import { formatLabelCode } from './code'

/**
 * What a cylinder is called in a list: by its label, else by its stamp.
 *
 * @example codeOrSerial({ labelCode: null, serial: 'K48213' }) // 'SN K48213'
 */
export function codeOrSerial({ labelCode, serial }: { labelCode: string | null, serial: string | null }): string {
  return labelCode ? formatLabelCode(labelCode) : `SN ${serial ?? '–'}`
}
