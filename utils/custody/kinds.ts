/**
 * The kinds of custody event, in the order a cylinder usually meets them.
 * A new kind is added here; the compiler then names every place that has to learn it.
 */
export const EVENT_KINDS = [
  'registered', 'labelled', 'received', 'moved', 'handed-over', 'weighed', 'filled', 'drawn', 'transferred', 'checked', 'emptied', 'lost',
  'inspected', 'quarantined', 'released', 'missing', 'found', 'retired',
  'sent-for-reclaim', 'reclaimed', 'returned', 'exchanged', 'sent-for-test', 'retested', 'corrected', 'countersigned',
] as const

export type EventKind = (typeof EVENT_KINDS)[number]

/** Kinds that only a dispatch may write: they need the shipment's or the lot's papers. */
export const DISPATCH_KINDS = ['sent-for-reclaim', 'sent-for-test'] as const satisfies readonly EventKind[]

/** Kinds that always happen between two cylinders: each is one half, in one cylinder's log. */
export const PAIRED_KINDS = ['transferred', 'exchanged'] as const satisfies readonly EventKind[]

export type PairedKind = (typeof PAIRED_KINDS)[number]

/** Kinds that are decisions: their author must name the version of the cylinder that was looked at. */
export const DECISION_KINDS = ['released', 'retired', 'reclaimed', 'corrected'] as const satisfies readonly EventKind[]
