/**
 * The one function of the package `qrcode` that utils/ uses. The package's published types bring Node's with
 * them, which must not be known in utils/; tsconfig.utils.json reads this file in their place.
 */
export interface QRCode {
  version: number
  modules: { size: number, get(row: number, column: number): number }
}

export function create(text: string, options: { errorCorrectionLevel: 'L' | 'M' | 'Q' | 'H' }): QRCode
