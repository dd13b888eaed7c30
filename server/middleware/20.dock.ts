import { defineEventHandler } from 'h3'
import { admitToDock } from '../utils/dock/dockGate'
import { asProblem } from '../utils/http/asProblem'
import { sendProblem } from '../utils/http/problem'

/** What comes over a dock link is looked at before any route sees it. */
export default defineEventHandler(async (event) => {
  try {
    await admitToDock(event, Date.now())
  }
  catch (error) {
    const told = asProblem(error)
    // Never with its path: that is the link itself.
    if (told.details.status >= 500) console.error('A dock link could not be looked at:', error)
    await sendProblem(event, told)
  }
})
