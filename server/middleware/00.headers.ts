import { defineEventHandler, setResponseHeader } from 'h3'
import { useEnvironment } from '../utils/environment'

const ONE_YEAR_SECONDS = 31_536_000

/** Headers of whatever is made for a person: kept by no cache, and by https for good where it is served so. */
export default defineEventHandler((event) => {
  setResponseHeader(event, 'Cache-Control', 'no-store')
  if (useEnvironment().secure) setResponseHeader(event, 'Strict-Transport-Security', `max-age=${ONE_YEAR_SECONDS}; includeSubDomains`)
})
