/** Tells a later visit of this browser that events are waiting in it, so that it looks for them at once. */
export const OUTBOX_WAITS_KEY = 'collarbook-outbox-waits'
