/**
 * How many events go in one sending at most.
 *
 * Apart from the schema that holds to it, so that a phone counts by it without the schemas.
 */
export const MOST_EVENTS = 200
