import { defineEventHandler } from 'h3'
import { sendProblem } from '../utils/http/problem'
import { refusalAtGate } from '../utils/http/requestGate'

/** Turns away what does not come from our own pages or is not JSON, before any route sees it. */
export default defineEventHandler(async (event) => {
  const refusal = refusalAtGate({ method: event.method, path: event.path, headers: event.node.req.headers })
  if (refusal) await sendProblem(event, refusal)
})
