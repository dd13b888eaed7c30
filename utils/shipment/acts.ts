/** What is done to a shipment, by our people and by the reclaimer's dock over its link, and what it is called in its history. */
export const ACT_WORDS = {
  'created': 'Made',
  'line-added': 'Put on the list',
  'line-removed': 'Taken off the list',
  'weighed': 'Scanned and weighed',
  'carrier-chosen': 'Carrier chosen',
  'classified': 'Classified by the shipper',
  'ready': 'Ready to leave',
  'unready': 'No longer ready',
  'dispatched': 'Dispatched',
  'papers-mailed': 'Papers mailed',
  'arrived': 'Arrived',
  'returned': 'Came back',
  'cancelled': 'Given up',
  'link-made': 'Dock link made',
  'link-revoked': 'Dock link withdrawn',
  'dock-here': 'Ticked as there',
  'dock-gross': 'Weighed at the dock',
  'dock-damaged': 'Damage reported',
  'dock-overdue': 'Retest date passed, reported',
  'dock-missing': 'Reported as not there',
  'dock-unexpected': 'A cylinder that was not expected',
  'dock-graded': 'Graded',
  'dock-sent-back': 'Sent back',
  'dock-taken-out': 'Entry taken out',
  'figures-set': 'Figures entered',
  'statement-taken': 'Statement taken over',
  'file-added': 'File added',
  'file-tied': 'File tied to lines',
  'file-withdrawn': 'File withdrawn',
  'dispute-opened': 'Dispute opened',
  'dispute-message': 'Said in a dispute',
  'dispute-ended': 'Dispute ended',
  'dispute-reopened': 'Dispute opened again',
  'settled': 'Settled',
  'closed': 'Closed',
} as const

export type ActKind = keyof typeof ACT_WORDS

/** Who did it: one of ours, or somebody at the dock by the name typed there. */
export type ActBy = { personId: string } | { linkId: string, linkName: string }

/** One thing that was done to a shipment. */
export interface ShipmentAct {
  id: string
  kind: ActKind
  /** The line it was about; null for the whole shipment. */
  cylinderId: string | null
  /** The same cylinder by its names. */
  cylinder: { id: string, labelCode: string | null, serial: string | null } | null
  details: Record<string, unknown>
  /** The name to show; null where it is not known any more. */
  by: string | null
  /** Said by the dock, not by one of ours. */
  isTheirs: boolean
  occurredAt: string
  recordedAt: string
}

/** GET /api/shipments/{id}/acts: as they were recorded. */
export interface ShipmentActsAnswer { items: ShipmentAct[] }
