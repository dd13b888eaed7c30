// Writes docs/pictures/*.png: screens of the demo firm as people of different roles see them. Needs a built server.
import { mkdirSync } from 'node:fs'
import { dirname, join, resolve } from 'node:path'
import { fileURLToPath } from 'node:url'
import { createJiti } from 'jiti'

const root = resolve(dirname(fileURLToPath(import.meta.url)), '..')
process.chdir(root)

const jiti = createJiti(import.meta.url, { alias: { '~~': root } })
const { launchBrowser } = await jiti.import('../tests/helpers/browser.ts')
const { TestClient } = await jiti.import('../tests/helpers/client.ts')
const { startServer } = await jiti.import('../tests/helpers/server.ts')
const { DEMO_PASSWORD, DEMO_TIME_ZONE } = await jiti.import('../server/utils/demo/cast.ts')

const PHONE = { viewport: { width: 412, height: 915 }, deviceScaleFactor: 1.5, isMobile: true, hasTouch: true }
const DESK = { viewport: { width: 1440, height: 900 } }
const FOLDER = join('docs', 'pictures')
const CANDIDATES = 40

/** The cylinders and the shipment of the demo firm that show most. */
async function chooseSubjects(baseUrl) {
  const manager = new TestClient(baseUrl)
  await manager.signIn('manager@demo.example', DEMO_PASSWORD)
  const items = async path => (await manager.get(path)).body.items
  const fleet = await items('/api/cylinders?limit=200')
  const shipments = await items('/api/shipments?limit=50')
  const halfFull = fleet.filter(({ lifecycle, findingCodes, netGrams, roomGrams, fillLimitGrams }) =>
    lifecycle === 'in-service' && findingCodes.length === 0 && roomGrams !== null && netGrams > 0.3 * fillLimitGrams && netGrams < 0.8 * fillLimitGrams)
  const logs = await Promise.all(halfFull.slice(0, CANDIDATES).map(async row => ({ row, lines: await items(`/api/cylinders/${row.id}/events?limit=200`) })))
  const longest = logs.sort((a, b) => kindsIn(b.lines) - kindsIn(a.lines) || b.lines.length - a.lines.length)[0]
  const overfilled = fleet.find(({ findingCodes }) => findingCodes.includes('overfill'))
  const received = shipments.find(({ state, cylinders }) => state === 'settled' && cylinders > 2)
  if (!longest || !overfilled || !received) throw new Error('The demo firm lacks a half full cylinder, an overfilled one or a settled shipment')
  return { cylinder: refOf(longest.row), overfilled: refOf(overfilled), shipment: received.id }
}

function kindsIn(lines) {
  return new Set(lines.map(({ kind }) => kind)).size
}

function refOf({ id, labelCode }) {
  return labelCode ?? id
}

function picturesOf({ cylinder, overfilled, shipment }) {
  return [
    { name: 'cylinder-phone-light', who: 'technician', screen: PHONE, theme: 'light', path: `/c/${cylinder}` },
    { name: 'cylinder-phone-dark', who: 'technician', screen: PHONE, theme: 'dark', path: `/c/${cylinder}` },
    { name: 'stop-phone-light', who: 'technician', screen: PHONE, theme: 'light', path: `/c/${overfilled}` },
    { name: 'stop-phone-dark', who: 'technician', screen: PHONE, theme: 'dark', path: `/c/${overfilled}` },
    { name: 'fill-phone-light', who: 'technician', screen: PHONE, theme: 'light', path: `/c/${cylinder}/act/filled` },
    { name: 'fleet-desk-light', who: 'manager', screen: DESK, theme: 'light', path: '/fleet' },
    { name: 'fleet-desk-dark', who: 'manager', screen: DESK, theme: 'dark', path: '/fleet' },
    { name: 'log-desk-light', who: 'auditor', screen: DESK, theme: 'light', path: `/c/${cylinder}/log` },
    { name: 'register-desk-light', who: 'warehouse', screen: DESK, theme: 'light', path: '/fleet/register', prepare: copyStamp },
    { name: 'shipment-desk-light', who: 'manager', screen: DESK, theme: 'light', path: `/shipments/${shipment}` },
  ]
}

/** An invented stamp as the warehouse would copy it. */
async function copyStamp(page) {
  const fields = {
    'Specification and service pressure': 'DOT-4BA400', 'Serial': 'K48213', 'Tare weight, TW, pounds': '27.5',
    'Water capacity, WC, pounds': '47.6', 'Made': '03-21', 'Test mark 1, the mark, or its month and year': '04-25',
  }
  for (const [label, value] of Object.entries(fields)) await page.getByLabel(label, { exact: label === 'Serial' }).fill(value)
  const answer = page.getByRole('group', { name: 'Marked for flammables', exact: true }).getByRole('button', { name: 'no', exact: true })
  await answer.click()
  await answer.blur()
  await page.getByRole('region', { name: 'What it could take, by this stamp' }).getByText('R-410A').waitFor()
  await page.waitForLoadState('networkidle')
}

async function take(browser, baseUrl, { name, who, screen, theme, path, prepare }) {
  const context = await browser.newContext({ ...screen, baseURL: baseUrl, colorScheme: theme, timezoneId: DEMO_TIME_ZONE, locale: 'en-US' })
  const answer = await context.request.post('/api/session', {
    data: { email: `${who}@demo.example`, password: DEMO_PASSWORD },
    headers: { 'sec-fetch-site': 'same-origin' },
  })
  if (!answer.ok()) throw new Error(`${who} cannot sign in: ${answer.status()}`)
  const page = await context.newPage()
  await page.goto(path, { waitUntil: 'networkidle' })
  await prepare?.(page)
  await page.evaluate(() => document.fonts.ready)
  await page.screenshot({ path: join(FOLDER, `${name}.png`), animations: 'disabled' })
  await context.close()
  console.log(`${name}.png`)
}

mkdirSync(FOLDER, { recursive: true })
const server = await startServer({ env: { COLLARBOOK_DEMO: '1' } })
const browser = await launchBrowser()
try {
  for (const picture of picturesOf(await chooseSubjects(server.baseUrl))) await take(browser, server.baseUrl, picture)
}
finally {
  await browser.close()
  await server.stop()
}
