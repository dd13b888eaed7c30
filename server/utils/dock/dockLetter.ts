import type { DockLink } from '../../../utils/contract/dock'
import { formatDay } from '../../../utils/quantity/instant'
import type { OwnFirm } from '../../../utils/contract/firm'
import { shipmentName } from '../../../utils/shipment/shipmentName'
import type { Letter } from '../mail/mail'

interface DockLetter { recipient: string, firm: OwnFirm, shipment: { number: number }, link: Pick<DockLink, 'forWhom' | 'expiresAt'>, url: string }

/** The letter that brings a dock its link to one shipment; it is kept without the link. */
export function dockLetter({ recipient, firm, shipment, link, url }: DockLetter): Letter {
  return {
    recipient,
    unkept: url,
    subject: `${firm.name}: ${shipmentName(shipment).toLowerCase()}, to tick off and weigh at your dock`,
    body: [
      `For ${link.forWhom}:`, '',
      `${firm.name} sends you recovered refrigerant with ${shipmentName(shipment).toLowerCase()}. Open this on a phone at the dock; it needs no account:`, '',
      url, '',
      `There each cylinder is ticked off and weighed, and what is damaged, missing or not on the papers is told. The link is good until ${formatDay(Date.parse(link.expiresAt), firm.timeZone)}. It opens this shipment to whoever has it.`, '',
      `Questions: ${firm.name}, ${firm.telephone}`, '',
    ].join('\n'),
  }
}
