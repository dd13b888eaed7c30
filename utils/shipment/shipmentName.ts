/** What a shipment is called. @example shipmentName({ number: 7 }) // 'Shipment 0007' */
export function shipmentName({ number }: { number: number }): string {
  return `Shipment ${String(number).padStart(4, '0')}`
}
