/** Tells a later visit of this browser that photos are waiting in it, so that it looks for them only then. */
export const PHOTOS_WAIT_KEY = 'collarbook-photos-wait'
