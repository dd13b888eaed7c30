/** How long each part of a question to the fleet may be that is free text. */
export const FLEET_TEXTS = { q: 80, refrigerant: 40, finding: 40, label: 20, cursor: 600 } as const

/** What each part of it takes that is chosen from a list. */
export const FLEET_CHOICES = {
  condition: ['clean', 'suspect', 'burnt', 'mixed', 'unknown'],
  lifecycle: ['in-service', 'quarantined', 'rejected', 'at-reclaim', 'at-test', 'missing', 'condemned', 'retired', 'given-away'],
  sort: ['urgency', 'code', 'serial', 'refrigerant', 'condition', 'lifecycle', 'net', 'room', 'stop', 'due', 'place', 'last-event'],
  order: ['asc', 'desc'],
} as const

/** The parts that name a place, a person or a firm by its id. */
export const FLEET_IDS = ['place', 'holder', 'owner'] as const
