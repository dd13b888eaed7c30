import type { Browser, BrowserContext, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { FORM_KINDS } from '../../utils/custody/draft/formKinds'
import { formatLabelCode } from '../../utils/label/code'
import { launchBrowser, listenForErrors } from '../helpers/browser'
import { demoFleet, type DemoFleet } from '../helpers/demoFleet'
import { fillOutbox } from '../helpers/outboxEntries'
import { seriousOn, sidewaysScroll, targetsLowerThan } from '../helpers/pageChecks'
import { startServer, type TestServer } from '../helpers/server'
import { projectFiles } from '../helpers/sources'
import { DESK, PHONE, visit } from '../helpers/visit'

const NARROW = { width: 320, height: 800 }
/** Row height of a screen that is used with gloves, in CSS px. */
const THUMB = 48

/** An instant that the demo firm's history covers. */
const LAST_MONTH = new Date(Date.now() - 30 * 86_400_000).toISOString()

type Who = keyof DemoFleet['people'] | 'nobody'

/** A page as somebody meets it; `empty` is a server that is not set up yet. */
interface Screen {
  as: Who
  at: (demo: DemoFleet) => string
  empty?: true
  /** The page answers so, and the browser says it in its console. */
  answers?: number
  /** What is pressed and typed to bring the page where it is looked at. */
  after?: (page: Page, demo: DemoFleet) => Promise<void>
}

const [technician, manager, admin, auditor, warehouse] = ['technician', 'manager', 'admin', 'auditor', 'warehouse'] as const

/** Every page by its file: who would open it, and where it has states that differ, each of them. */
const SCREENS: Record<string, Screen[]> = {
  'account.vue': [{ as: technician, at: () => '/account' }],
  'balance/index.vue': [
    { as: manager, at: () => '/balance?period=this-year' },
    { as: auditor, at: () => '/balance?from=2026-01-01&to=2026-01-02&owner=own' },
    { as: technician, at: () => '/balance' },
  ],
  'balance/movements.vue': [
    { as: manager, at: () => '/balance/movements?period=this-year&line=recovered' },
    { as: auditor, at: () => '/balance/movements?period=this-month&line=found' },
  ],
  'batch.vue': [
    { as: technician, at: () => '/batch' },
    { as: warehouse, at: () => '/batch?act=unload' },
    { as: 'trainee', at: () => '/batch?act=move' },
  ],
  'c/[ref]/index.vue': [
    { as: 'nobody', at: demo => `/c/${demo.codes.usual}` },
    { as: technician, at: demo => `/c/${demo.codes.usual}` },
    { as: technician, at: demo => `/c/${demo.codes.empty}` },
    { as: technician, at: demo => `/c/${demo.codes.empty}?refrigerant=R-22` },
    { as: technician, at: demo => `/c/${demo.codes.overfilled}` },
    { as: technician, at: demo => `/c/${demo.codes.onTwo}` },
    { as: technician, at: demo => `/c/${demo.codes.onNone}`, answers: 404 },
    { as: manager, at: demo => `/c/${demo.codes.usual}` },
  ],
  'c/[ref]/as-it-stood.vue': [
    { as: technician, at: demo => `/c/${demo.codes.usual}/as-it-stood` },
    { as: manager, at: demo => `/c/${demo.codes.usual}/as-it-stood?asOf=${LAST_MONTH}` },
    { as: auditor, at: demo => `/c/${demo.codes.usual}/as-it-stood?knownAt=${LAST_MONTH}` },
  ],
  'c/[ref]/act/[kind].vue': [
    ...FORM_KINDS.map(kind => ({ as: warehouse, at: (demo: DemoFleet) => `/c/${demo.codes.usual}/act/${kind}` })),
    { as: 'trainee', at: demo => `/c/${demo.codes.usual}/act/weighed` },
  ],
  'c/[ref]/act/transferred.vue': [{ as: technician, at: demo => `/c/${demo.codes.usual}/act/transferred` }],
  'c/[ref]/act/exchanged.vue': [{ as: warehouse, at: demo => `/c/${demo.codes.usual}/act/exchanged` }],
  'c/[ref]/act/corrected.vue': [{ as: manager, at: demo => `/c/${demo.codes.usual}/act/corrected?event=${demo.event}` }],
  'countersign.vue': [
    { as: technician, at: () => '/countersign' },
    { as: manager, at: () => '/countersign' },
    { as: 'trainee', at: () => '/countersign' },
  ],
  'c/[ref]/working.vue': [
    ...(['usual', 'empty', 'overfilled', 'onTwo'] as const).map(code => ({ as: technician, at: (demo: DemoFleet) => `/c/${demo.codes[code]}/working` })),
    { as: manager, at: demo => `/c/${demo.codes.empty}/working?refrigerant=R-22` },
  ],
  'c/[ref]/tag.vue': [
    { as: technician, at: demo => `/c/${demo.codes.usual}/tag` },
    { as: technician, at: demo => `/c/${demo.codes.empty}/tag` },
    { as: warehouse, at: demo => `/c/${demo.codes.usual}/tag` },
  ],
  'c/[ref]/recover.vue': [
    { as: technician, at: demo => `/c/${demo.codes.usual}/recover` },
    { as: technician, at: demo => `/c/${demo.codes.empty}/recover` },
    { as: technician, at: demo => `/c/${demo.codes.overfilled}/recover` },
    { as: technician, at: demo => `/c/${demo.codes.usual}/recover`, after: async (page) => {
      await page.getByRole('button', { name: /^As last weighed/ }).click()
      await page.getByRole('button', { name: 'Start filling' }).click()
      await page.keyboard.type('6000.0')
      await page.keyboard.press('Enter')
      await page.getByRole('button', { name: /^Yes, note/ }).click()
      await page.getByRole('button', { name: /^It is stopped/ }).waitFor()
    } },
    { as: technician, at: demo => `/c/${demo.codes.usual}/recover`, after: beginsToFill },
    { as: technician, at: demo => `/c/${demo.codes.usual}/recover`, after: async (page) => {
      await beginsToFill(page)
      await page.getByRole('button', { name: 'Stopped? Hoses off' }).click()
      await page.getByRole('button', { name: 'Put this recovery away' }).click()
      await page.getByRole('button', { name: 'Keep it' }).waitFor()
    } },
    { as: technician, at: demo => `/c/${demo.codes.usual}/recover`, after: async (page) => {
      await beginsToFill(page)
      await page.getByRole('button', { name: 'Stopped? Hoses off' }).click()
      await page.getByRole('button', { name: 'Hoses are off: weigh it' }).click()
      await page.keyboard.type('600.0')
      await page.keyboard.press('Enter')
      await page.getByText('Vacuum of the system, and how long it held').click()
      await page.getByLabel('Gauge shows').waitFor()
      await page.getByLabel(/^Record it anyway/).waitFor()
    } },
  ],
  'c/[ref]/log.vue': [{ as: auditor, at: demo => `/c/${demo.codes.usual}/log` }],
  'd/[token].vue': [
    { as: 'nobody', at: demo => `/d/${demo.docks.dispatched}` },
    { as: 'nobody', at: demo => `/d/${demo.docks.dispatched}`, after: async (page) => {
      await page.getByLabel('Your name').fill('Dana')
      await page.getByRole('button', { name: 'Begin' }).click()
    } },
    { as: 'nobody', at: demo => `/d/${demo.docks.dispatched}`, after: async (page) => {
      await page.getByLabel('Your name').fill('Dana')
      await page.getByRole('button', { name: 'Begin' }).click()
      await page.getByRole('list').getByRole('button').first().click()
      await page.getByRole('button', { name: 'It is here' }).click()
      for (const key of ['4', '9']) await page.getByRole('button', { name: key, exact: true }).click()
      await page.getByRole('button', { name: 'Enter 49' }).click()
      await page.getByText('Gross as it left').waitFor()
      await page.getByRole('button', { name: 'Damaged' }).click()
    } },
    { as: manager, at: demo => `/d/${demo.docks.settled}`, after: page => page.getByText('This shipment is settled').waitFor() },
    { as: 'nobody', at: () => `/d/${'x'.repeat(60)}`, answers: 404, after: page => page.getByText('This link opens nothing').waitFor() },
  ],
  'evacuation-level.vue': [
    { as: technician, at: () => '/evacuation-level' },
    { as: technician, at: () => '/evacuation-level?refrigerant=R-32&charge=250lb&machineMade=1990&circumstances=leaking' },
    { as: manager, at: () => '/evacuation-level?refrigerant=R-134a&charge=250lb&machineMade=2015&inHg=14&heldMinutes=5' },
  ],
  'fill-limit.vue': [
    { as: technician, at: () => '/fill-limit' },
    { as: technician, at: () => '/fill-limit?refrigerant=R-290&waterCapacity=47.7lb&tareWeight=27.9lb&spec=DOT-4BA400' },
    { as: manager, at: () => '/fill-limit?composition=R-32:50&waterCapacity=fortyseven&spec=DOT-9X' },
    { as: manager, at: () => '/fill-limit?refrigerant=R-744&waterCapacity=47.7lb&tareWeight=97.9lb&spec=DOT-3AA1800' },
  ],
  'fleet/index.vue': [{ as: manager, at: () => '/fleet' }, { as: auditor, at: () => '/fleet?finding=stop' }, { as: manager, at: () => `/fleet?asOf=${LAST_MONTH}`, after: page => page.getByText('Fetching the fleet').waitFor({ state: 'detached', timeout: 20_000 }) }],
  'fleet/register.vue': [{ as: warehouse, at: () => '/fleet/register' }],
  'hand-over.vue': [
    { as: technician, at: () => '/hand-over' },
    { as: warehouse, at: demo => `/hand-over?with=${demo.offer}`, answers: 404, after: page => page.getByRole('button', { name: 'I have it now' }).waitFor() },
    { as: technician, at: () => '/hand-over?with=CYLINDERS2/O' },
  ],
  'invitation/[token].vue': [
    { as: 'nobody', at: demo => `/invitation/${demo.invitation}` },
    { as: 'nobody', at: () => `/invitation/${'x'.repeat(43)}` },
  ],
  'labels.vue': [
    { as: warehouse, at: () => '/labels' },
    { as: warehouse, at: demo => `/labels?codes=${demo.codes.usual}` },
  ],
  'log.vue': [{ as: auditor, at: () => '/log' }],
  'mail.vue': [{ as: admin, at: () => '/mail' }],
  'now.vue': [...([technician, warehouse, manager, auditor, admin] as const).map(as => ({ as, at: () => '/now' }))],
  'people.vue': [{ as: admin, at: () => '/people' }],
  'firms/index.vue': [{ as: admin, at: () => '/firms' }, { as: warehouse, at: () => '/firms?kind=carrier' }],
  'firms/[id].vue': [
    { as: manager, at: demo => `/firms/${demo.reclaimer}`, after: page => page.getByRole('button', { name: 'Record what it takes' }).click() },
    { as: manager, at: demo => `/firms/${demo.reclaimer}`, after: page => page.getByRole('button', { name: 'Record a price' }).click() },
    { as: technician, at: demo => `/firms/${demo.reclaimer}` },
    { as: manager, at: demo => `/firms/${demo.customer}`, after: page => page.getByText('Every change of what is theirs', { exact: true }).click() },
  ],
  'jobs/index.vue': [
    { as: technician, at: () => '/jobs', after: page => page.getByRole('button', { name: 'New job' }).click() },
    { as: manager, at: () => '/jobs?refrigerant=R-14' },
  ],
  'jobs/[id].vue': [{ as: technician, at: demo => `/jobs/${demo.job}` }, { as: auditor, at: demo => `/jobs/${demo.job}` }],
  'our-firm.vue': [{ as: admin, at: () => '/our-firm' }, { as: technician, at: () => '/our-firm' }],
  'scales.vue': [{ as: manager, at: () => '/scales' }, { as: technician, at: () => '/scales' }],
  'places.vue': [{ as: admin, at: () => '/places' }, { as: technician, at: () => '/places' }],
  'plans/index.vue': [{ as: warehouse, at: () => '/plans' }, { as: technician, at: () => '/plans' }],
  'plans/[id].vue': [{ as: warehouse, at: demo => `/plans/${demo.plan}` }, { as: technician, at: demo => `/plans/${demo.plan}` }],
  'pressure-check.vue': [
    { as: technician, at: () => '/pressure-check' },
    { as: technician, at: () => '/pressure-check?refrigerant=R-410A&pressureKPa=1869.8&temperatureC=26.667' },
    { as: technician, at: () => '/pressure-check?refrigerant=R-744&pressureKPa=9000&temperatureC=40' },
    { as: manager, at: () => '/pressure-check?refrigerant=R-409A&pressureKPa=690&temperatureC=26.667&barometerKPa=84.3' },
  ],
  'reclaim.vue': [{ as: manager, at: () => '/reclaim', after: page => page.getByText(/would be refused/).first().click() }, { as: technician, at: () => '/reclaim' }],
  'refrigerants/[designation].vue': [
    { as: manager, at: () => '/refrigerants/R-454B' }, { as: technician, at: () => '/refrigerants/R-407B' },
    { as: technician, at: () => '/refrigerants/R-9999', answers: 404 },
  ],
  'refrigerants/index.vue': [{ as: manager, at: () => '/refrigerants' }, { as: technician, at: () => '/refrigerants?q=xyz' }],
  'retests/[id].vue': [...(['draft', 'sent', 'back'] as const).map(state => ({ as: manager, at: (demo: DemoFleet) => `/retests/${demo.lots[state]}` }))],
  'retests/index.vue': [{ as: manager, at: () => '/retests' }],
  'rules.vue': [{ as: manager, at: () => '/rules' }, { as: technician, at: () => '/rules' }],
  'scan.vue': [{ as: technician, at: () => '/scan' }],
  'setup.vue': [{ as: 'nobody', at: demo => `/setup?token=${demo.setUpToken}`, empty: true }, { as: 'nobody', at: () => '/setup' }],
  'shipments/[id]/index.vue': [...(['draft', 'ready', 'dispatched', 'settled', 'cancelled'] as const).map(state => ({ as: manager, at: (demo: DemoFleet) => `/shipments/${demo.shipments[state]}` }))],
  'shipments/[id]/settlement.vue': [
    { as: manager, at: demo => `/shipments/${demo.shipments.settled}/settlement` },
    { as: manager, at: demo => `/shipments/${demo.shipments.dispatched}/settlement`, after: async (page) => {
      await page.getByRole('button', { name: 'Enter figures' }).click()
      await page.getByRole('button', { name: 'Read a statement’s file' }).click()
    } },
    { as: auditor, at: demo => `/shipments/${demo.shipments.settled}/settlement` },
  ],
  'shipments/[id]/weigh.vue': [{ as: manager, at: (demo: DemoFleet) => `/shipments/${demo.shipments.draft}/weigh` }],
  'shipments/index.vue': [{ as: manager, at: () => '/shipments' }],
  'sign-in.vue': [{ as: 'nobody', at: () => '/sign-in' }],
  'unsent.vue': [
    { as: technician, at: () => '/unsent', after: page => page.getByText('Everything from this device is recorded.').waitFor() },
    { as: technician, at: () => '/unsent', after: (page, demo) => fillOutbox(page, demo.codes.usual) },
  ],
  'van.vue': [{ as: technician, at: () => '/van' }, { as: warehouse, at: () => '/van' }],
  'vans/[id]/check-in.vue': [{ as: warehouse, at: demo => `/vans/${demo.van}/check-in` }],
  'vans/[id]/index.vue': [{ as: manager, at: demo => `/vans/${demo.van}` }, { as: technician, at: demo => `/vans/${demo.van}` }],
  'vans/index.vue': [{ as: manager, at: () => '/vans' }, { as: technician, at: () => '/vans' }],
  'which-cylinder.vue': [
    { as: technician, at: () => '/which-cylinder' },
    { as: manager, at: demo => `/which-cylinder?refrigerant=R-410A&amount=9lb&van=${demo.van}` },
    { as: technician, at: () => '/which-cylinder?refrigerant=R-22&amount=900lb' },
  ],
}

/** What pages show only once something is pressed. */
const PRESSED: Record<string, Screen> = {
  'a wrong password': { as: 'nobody', at: () => '/sign-in', answers: 401, after: async (page) => {
    await page.getByLabel('Email address').fill('nobody@demo.example')
    await page.getByLabel('Password', { exact: true }).fill('not-this-one-0000')
    await page.getByRole('button', { name: 'Sign in' }).click()
    await page.getByRole('alert').waitFor()
  } },
  'a cylinder with heat': { as: technician, at: demo => `/c/${demo.codes.usual}`, after: async (page) => {
    await page.getByText('With heat').click()
    await page.getByRole('slider').waitFor()
  } },
  'the columns of the fleet': { as: manager, at: () => '/fleet', after: async (page) => {
    await page.getByRole('button', { name: 'Columns' }).click()
    await page.getByRole('dialog').waitFor()
  } },
  'a view of the fleet that is being named': { as: manager, at: () => '/fleet?refrigerant=R-22', after: async (page) => {
    await page.getByRole('button', { name: 'Save this view' }).click()
    await page.getByLabel('Name of the view').waitFor()
  } },
  'cylinders of the fleet that are chosen': { as: warehouse, at: () => '/fleet', after: async (page) => {
    // On a phone as cards, at a desk as rows; the others are hidden.
    await page.getByLabel(/^Choose (?!all)/).and(page.locator(':visible')).first().check()
    await page.getByText('1 chosen').waitFor()
  } },
  'a van of which nothing was scanned': { as: warehouse, at: demo => `/vans/${demo.van}/check-in`, after: async (page) => {
    const shops = page.getByLabel('They come to')
    if (await shops.isVisible()) await shops.selectOption({ index: 1 })
    await page.getByRole('button', { name: /^Check in without/ }).click()
    await page.getByRole('dialog').waitFor()
  } },
  'the sum of a rule that does not govern': { as: technician, at: demo => `/c/${demo.codes.usual}/working`, after: async (page) => {
    const sums = page.getByRole('button', { name: /^Show its sum/ })
    if (await sums.first().isVisible()) await sums.first().click()
  } },
  'what a fill rule would change': { as: manager, at: () => '/rules', after: async (page) => {
    await page.getByRole('button', { name: 'Set a fill rule' }).click()
    await page.getByLabel('Liquid at 131 °F, at most').fill('75')
    await page.getByLabel('Share of the cylinder').fill('75')
    await page.getByRole('button', { name: 'Show what it changes' }).click()
    await page.getByText(/would be overfilled/).waitFor()
  } },
  'retest choices that say no reason': { as: admin, at: () => '/rules', after: async (page) => {
    await page.getByRole('button', { name: 'Set retests and reminders' }).click()
    await page.getByText(/^49 CFR 180.209\(e\)/).click()
    await page.getByRole('button', { name: 'Show what it changes' }).click()
    await page.getByText('Say how it is known').first().waitFor()
  } },
  'a weight that is missing': { as: warehouse, at: demo => `/c/${demo.codes.usual}/act/weighed`, after: async (page) => {
    await page.getByRole('button', { name: 'Record the weight' }).click()
    await page.getByRole('alert').waitFor()
  } },
  'what will be found': { as: warehouse, at: demo => `/c/${demo.codes.usual}/act/weighed`, after: async (page) => {
    await page.getByLabel(/^The scale shows, /).first().fill('600')
    await page.getByLabel('Record it anyway: it happened').waitFor()
  } },
  'what was found': { as: warehouse, at: demo => `/c/${demo.codes.empty}/act/weighed`, after: async (page) => {
    await page.getByLabel(/^The scale shows, /).first().fill('600')
    await page.getByLabel('Record it anyway: it happened').check()
    await page.getByRole('button', { name: 'Record the weight' }).click()
    await page.getByText('Recorded: weighed').first().waitFor()
  } },
  'a known label that was typed': { as: technician, at: () => '/scan', after: (page, demo) => typed(page, demo.codes.usual) },
  'a label with a stop': { as: technician, at: () => '/scan', after: (page, demo) => typed(page, demo.codes.overfilled) },
  'a label on no cylinder': { as: technician, at: () => '/scan', answers: 404, after: (page, demo) => typed(page, demo.codes.onNone) },
  'a code that does not fit': { as: technician, at: () => '/scan', after: async (page) => {
    await page.getByLabel('Nine characters of the label').fill('7K3M9Q2TW')
    await page.getByText('The ninth character does not fit').waitFor()
  } },
  'a list with a cylinder, an overfilled one and a label on none': { as: technician, at: () => '/batch?act=load', answers: 404, after: async (page, demo) => {
    await page.getByLabel('Van', { exact: true }).selectOption({ index: 1 })
    for (const code of [demo.codes.usual, demo.codes.onNone, demo.codes.overfilled]) {
      await page.getByLabel('Nine characters of the label').fill(code)
      await page.getByRole('button', { name: `Take ${formatLabelCode(code.toUpperCase())} off the list` }).waitFor()
    }
    await page.getByText(/^Not this cylinder/).first().waitFor()
  } },
  'how the stop weight is worked out': { as: technician, at: demo => `/c/${demo.codes.usual}`, after: async (page) => {
    for (const summary of await page.locator('summary').all()) await summary.click()
  } },
  'a registration with everything missing': { as: warehouse, at: () => '/fleet/register', after: async (page) => {
    await page.getByRole('button', { name: /^Register/ }).last().click()
    await page.getByText(/still open/).first().waitFor()
  } },
  'cylinders picked in the fleet': { as: manager, at: () => '/fleet?finding=retest-soon', after: async (page) => {
    await page.locator('input[type=checkbox]:visible').nth(1).check()
  } },
  'the menu': { as: admin, at: () => '/people', after: async (page) => {
    const menu = page.getByRole('button', { name: 'Menu' })
    if (await menu.isVisible()) await menu.click()
    await page.getByRole('button', { name: 'Invite a person' }).click()
    await page.getByRole('heading', { name: 'Invite a person' }).waitFor()
  } },
  'a line taken off without a reason': { as: manager, at: demo => `/shipments/${demo.shipments.draft}`, after: async (page) => {
    await page.getByRole('button', { name: /^Take off/ }).locator('visible=true').first().click()
    await page.getByRole('dialog').getByRole('button', { name: 'Take off' }).click()
    await page.getByText('Say why: it stays in the history.').waitFor()
  } },
  'cylinders that came back': { as: manager, at: demo => `/shipments/${demo.shipments.dispatched}`, after: async (page) => {
    await page.getByRole('button', { name: 'Take cylinders back' }).click()
    await page.getByRole('checkbox').first().check()
    await page.getByRole('button', { name: 'Take 1 back' }).click()
    await page.getByText('1 of them is not weighed yet.').waitFor()
  } },
  'a log that was verified': { as: auditor, at: () => '/log', after: async (page) => {
    await page.getByRole('button', { name: 'Verify all' }).click()
    await page.getByText('Unbroken').waitFor()
  } },
}

/** Goes on to the step of a recovery at which the scale is read. */
async function beginsToFill(page: Page): Promise<void> {
  await page.getByRole('button', { name: /^As last weighed/ }).click()
  await page.getByRole('button', { name: 'Start filling' }).click()
  await page.getByText('No reading yet').waitFor()
}

/** Without a camera the scan screen asks for the code by keys. */
async function typed(page: Page, code: string): Promise<void> {
  await page.getByLabel('Nine characters of the label').fill(code)
  await page.getByRole('region', { name: /^(Cylinder|On no cylinder)/ }).or(page.getByText('A label on no cylinder')).first().waitFor()
}

/** Pages that show nothing, and why. */
const WITHOUT_SCREEN: Record<string, string> = {
  'c/[ref]/act/countersigned.vue': 'leads on to what waits for a signature on the cylinder',
  'index.vue': 'leads on to the first screen of whoever opens it',
  'shell.vue': 'stands for the page that was asked for, where the server is not reached',
}

let server: TestServer
let empty: TestServer
let browser: Browser
let demo: DemoFleet

beforeAll(async () => {
  [server, empty, browser] = await Promise.all([startServer({ env: { COLLARBOOK_DEMO: '1' } }), startServer(), launchBrowser()])
  demo = await demoFleet(server, empty.setUpToken())
})
afterAll(async () => {
  await browser?.close()
  await Promise.all([server?.stop(), empty?.stop()])
})

async function opened({ as, at, empty: onEmpty, answers, after }: Screen): Promise<{ page: Page, context: BrowserContext, said: string[] }> {
  const client = as === 'nobody' ? null : demo.people[as]
  const context = await visit(browser, client, { viewport: PHONE, reducedMotion: 'reduce', colorScheme: 'light' })
  const said = listenForErrors(context)
  const page = await context.newPage()
  const address = `${(onEmpty ? empty : server).baseUrl}${at(demo)}`
  const answer = await page.goto(address, { waitUntil: 'networkidle' })
  expect(answer?.status(), 'the page itself, and no word that something broke').toBe(after ? 200 : answers ?? 200)
  expect(page.url(), 'the page itself, and no other that it led on to').toBe(address)
  await after?.(page, demo)
  return { page, context, said }
}

/** Everything that is wrong with a page: on a phone in light and in dark, then as wide as a desk in dark and in light. */
async function wrongWith(screen: Screen): Promise<string[]> {
  const { page, context, said } = await opened(screen)
  const wrong: string[] = []
  const note = (where: string, found: string[]) => wrong.push(...found.map(one => `${where}: ${one}`))
  const turn = async (colorScheme: 'light' | 'dark') => {
    await page.emulateMedia({ colorScheme })
    await page.locator(`html.${colorScheme}`).waitFor({ timeout: 15_000 })
  }
  note('phone', await seriousOn(page))
  if (await page.locator('.for-thumbs').count() > 0) note('too low for a thumb', await targetsLowerThan(page, THUMB))
  await page.setViewportSize(NARROW)
  note('at 320 px', await sidewaysScroll(page))
  await page.setViewportSize(PHONE)
  await turn('dark')
  note('phone, dark', await seriousOn(page, 'colours'))
  await page.setViewportSize(DESK)
  note('desk, dark', await seriousOn(page, 'colours'))
  await turn('light')
  note('desk', await seriousOn(page))
  note('console', said.filter(line => !(screen.answers && line.includes(`status of ${screen.answers}`))))
  await context.close()
  return wrong
}

describe('every page', () => {
  it('has a screen here, or says why it shows nothing', () => {
    const pages = projectFiles(/\.vue$/, 'pages').map(path => path.replace('pages/', ''))
    expect([...Object.keys(SCREENS), ...Object.keys(WITHOUT_SCREEN)].sort()).toEqual(pages.sort())
  })

  it.concurrent.each(Object.entries(SCREENS).flatMap(([file, screens]) => screens.map((screen, index) => ({ file, screen, who: screen.as, nth: index + 1 }))))(
    'can be read and pressed by everybody on a phone and at a desk, in light and in dark, and says nothing of errors: $file $nth, for $who',
    async ({ screen }) => {
      expect(await wrongWith(screen)).toEqual([])
    })
})

describe('what a page shows once something is pressed', () => {
  it.concurrent.each(Object.entries(PRESSED))('is as good to read and to press: %s', async (_, screen) => {
    expect(await wrongWith(screen)).toEqual([])
  })
})

describe('the checks themselves', () => {
  const WORN = '<html lang="en"><title>Worn</title><body style="margin:0"><main><h1>Worn</h1>'
    + '<p style="color:#bbb;background:#fff">pale words</p><button style="height:20px">Go</button>'
    + '<p>in a <a href="#x">sentence</a> of words</p><div style="width:900px">wide</div></main></body></html>'

  it('find pale words, a low button and a page that is too wide', async () => {
    const context = await visit(browser, null)
    const page = await context.newPage()
    await page.setContent(WORN)
    expect((await seriousOn(page)).join()).toContain('color-contrast')
    expect((await seriousOn(page, 'colours')).join()).toContain('color-contrast')
    expect(await targetsLowerThan(page, THUMB)).toEqual(['BUTTON "Go": 20 px'])
    expect(await sidewaysScroll(page)).toEqual(['the page: 900 px in 412'])
    await context.close()
  })
})
