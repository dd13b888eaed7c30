// Checks the export of a custody log with nothing but Node, and without a line of the program that wrote it:
//
//   node check-custody-log.mjs custody-log.ndjson --key 'custody-log/…+…+…'
//
// It computes every hash and chain again, looks for missing numbers, verifies the checkpoints, their signatures and the
// Merkle root at each, and works out from its events how much is in each cylinder. One line for each fault it finds;
// it ends with 0 where there is none, with 1 where there is one, with 2 where it cannot tell.
//
// --key is the public key as the firm gave it to you, or as it stands in the letters with the checkpoints; it may be
// given more than once. Without it the key in the export itself is taken, which proves only that the export fits itself.
import { createHash, createPublicKey, verify } from 'node:crypto'
import { createReadStream } from 'node:fs'
import process from 'node:process'
import { createInterface } from 'node:readline'

// The columns that the hash of a line is taken of, as a JSON array in this order (UTF-8).
const HASHED = [
  'prev_hash', 'seq', 'id', 'cylinder_id', 'version', 'device_id', 'device_seq', 'kind', 'occurred_at', 'occurred_offset_minutes',
  'clock_skew_seconds', 'effective_at', 'recorded_at', 'actor_id', 'posted_by', 'supervisor_id', 'trainee', 'place_id', 'body', 'content_hash',
]
const MOST_EVENTS = 1_000_000_000
const MOST_PRINTED = 200

let faults = 0

function fault(text) {
  faults++
  if (faults <= MOST_PRINTED) console.log(text)
  if (faults === MOST_PRINTED) console.log('More faults are only counted.')
}

function giveUp(text) {
  console.error(text)
  process.exit(2)
}

function sha256(...parts) {
  const hash = createHash('sha256')
  for (const part of parts) hash.update(part)
  return hash.digest()
}

// What the command line says

function argumentsOf(given) {
  const keys = []
  const files = []
  for (let at = 0; at < given.length; at++) {
    if (given[at] === '--key') keys.push(given[++at] ?? '')
    else files.push(given[at])
  }
  if (files.length !== 1) giveUp('Say which file: node check-custody-log.mjs custody-log.ndjson --key \'<public key>\'')
  return { file: files[0], keys }
}

// Checkpoints: C2SP signed-note, Ed25519 (RFC 8032), Merkle trees (RFC 6962)

/** A public key: name, its id in hexadecimal, base64 of the byte 1 and the key; null where the text is none. */
function publicKey(text) {
  const [, name, id, base64] = /^([^\s+]+)\+([0-9a-f]{8})\+([A-Za-z0-9+/]{44})$/.exec(text) ?? []
  if (name === undefined) return null
  const bytes = Buffer.from(base64, 'base64')
  const own = sha256(`${name}\n`, bytes).subarray(0, 4).toString('hex')
  if (bytes[0] !== 1 || own !== id) return null
  // RFC 8410: what stands before an Ed25519 key in DER.
  const der = Buffer.concat([Buffer.from('302a300506032b6570032100', 'hex'), bytes.subarray(1)])
  return { name, id, key: createPublicKey({ key: der, format: 'der', type: 'spki' }) }
}

function readCheckpoint(note, keys) {
  const cut = note.lastIndexOf('\n\n')
  const text = note.slice(0, cut + 1)
  const [origin, cylinders, root, ...more] = text.split('\n')
  const named = Object.fromEntries(more.filter(line => line !== '').map(line => line.split(' ')))
  let signedBy = 'nobody'
  for (const line of note.slice(cut + 2).split('\n')) {
    const [dash, name, base64] = line.split(' ')
    if (dash !== '\u2014' || base64 === undefined) continue
    const bytes = Buffer.from(base64, 'base64')
    const key = keys.find(one => one.name === name && one.id === bytes.subarray(0, 4).toString('hex'))
    if (key) signedBy = verify(null, Buffer.from(text), key.key, bytes.subarray(4)) ? 'a key' : 'a forger'
    else if (signedBy === 'nobody') signedBy = 'another key'
  }
  return {
    note, origin, root, signedBy, cylinders: Number(cylinders), number: Number(named.number), events: Number(named.events), seq: Number(named.seq),
    previous: named.previous, counted: 0, leaves: 0, tree: [],
  }
}

/** The checkpoints by themselves, oldest first. */
function checkCheckpoints(checkpoints, origin) {
  let before = null
  for (const one of checkpoints) {
    const name = `checkpoint ${one.number}`
    if (one.signedBy === 'a forger') fault(`${name}: its text is not what was signed`)
    else if (one.signedBy !== 'a key') fault(`${name}: it is signed by ${one.signedBy}, and not by a key that you trust`)
    if (one.origin !== origin) fault(`${name}: it is of another log, ${one.origin}`)
    if (one.number !== (before?.number ?? 0) + 1) fault(`${name}: the one before it is missing`)
    const previous = before ? sha256(before.note).toString('hex') : 'none'
    if (one.previous !== previous) fault(`${name}: it does not name the one before it`)
    if (before && one.seq < before.seq) fault(`${name}: the log was longer at the one before it`)
    before = one
  }
}

// A tree as the roots of its full parts, from left to right: [how many leaves, root].
function addLeaf(tree, leaf) {
  let part = [1, leaf]
  while (tree.length > 0 && tree.at(-1)[0] === part[0]) {
    const left = tree.pop()
    part = [left[0] * 2, sha256(Buffer.of(1), left[1], part[1])]
  }
  tree.push(part)
}

function rootOf(tree) {
  if (tree.length === 0) return sha256('')
  return tree.map(([, root]) => root).reduceRight((right, left) => sha256(Buffer.of(1), left, right))
}

// The lines of one cylinder

function checkChain(rows) {
  let before = null
  for (const row of rows) {
    const name = `cylinder ${row.cylinder_id}, version ${row.version} (number ${row.seq})`
    if (row.version !== (before?.version ?? 0) + 1) fault(`${name}: a line before it is missing`)
    if (row.prev_hash !== (before?.hash ?? '')) fault(`${name}: it does not follow the line before it`)
    if (sha256(JSON.stringify(HASHED.map(column => row[column]))).toString('hex') !== row.hash) fault(`${name}: one of its columns was changed`)
    if (before && row.seq <= before.seq) fault(`${name}: it was recorded before the line that it follows`)
    before = row
  }
}

/** Adds the cylinder to the tree of each checkpoint, as it ended then. */
function addToTrees(rows, checkpoints) {
  const leaves = new Map()
  for (const one of checkpoints) {
    const known = rows.filter(row => row.seq <= one.seq)
    one.counted += known.length
    const last = known.at(-1)
    if (!last) continue
    if (!leaves.has(last)) leaves.set(last, sha256(Buffer.of(0), JSON.stringify([last.cylinder_id, last.version, last.hash])))
    addLeaf(one.tree, leaves.get(last))
    one.leaves++
  }
}

// How much is in a cylinder, by its events alone

const GRAMS_PER_POUND = 453.59237

function exactGrams(reading) {
  if (reading.unit === 'lb') return reading.value * GRAMS_PER_POUND
  if (reading.unit === 'lb-oz') return (reading.lb * 16 + reading.oz) * GRAMS_PER_POUND / 16
  return reading.value * 1000
}

/** How far a gross weight may be off: the larger of so many grams and so many percent, by the scale or as usual. */
function accuracy(grossGrams, scale) {
  const grams = scale?.accuracyGrams ?? GRAMS_PER_POUND / 32
  const percent = scale?.accuracyPercent ?? 0.5
  return Math.max(0, Math.ceil(Math.max(grams, grossGrams * percent / 100) - 1e-9))
}

function isMass(value) {
  const isUpTo = (part, most) => typeof part === 'number' && part >= 0 && part <= most
  if (typeof value !== 'object' || value === null) return false
  const { unit, ...rest } = value
  const names = Object.keys(rest).sort().join(' ')
  if (unit === 'lb') return names === 'value' && isUpTo(rest.value, 100_000)
  if (unit === 'kg') return names === 'value' && isUpTo(rest.value, 45_000)
  return unit === 'lb-oz' && names === 'lb oz' && isUpTo(rest.lb, 100_000) && Number.isInteger(rest.lb) && isUpTo(rest.oz, 16) && rest.oz < 16
}

// The fields of each kind's details; those with an exclamation mark must be there.
const FIELDS = {
  'registered': 'stamp! marks ownership! ownerId dedicatedTo contents gross',
  'labelled': 'code! replaces reason',
  'received': 'fromFirmId gross paper',
  'returned': 'fromFirmId! gross',
  'moved': 'toPlaceId! toHolderId',
  'handed-over': 'toHolderId!',
  'weighed': 'gross! scaleId',
  'filled': 'refrigerant! condition grossBefore grossAfter! method jobId ownerOfRefrigerantId scaleId looked readings ownerConsents purged reached',
  'drawn': 'grossAfter! purpose! jobId toOwnerId phase',
  'transferred': 'direction! counterpartId! transferId! refrigerant! condition! ownerOfRefrigerantId ownerConsents grossBefore grossAfter!',
  'lost': 'grossAfter cause! unavoidable',
  'checked': 'method! pressureKPa temperatureC barometerKPa gaugeErrorKPa thermometerErrorC composition verdict',
  'emptied': 'grossAfter vacuum',
  'inspected': 'result! reasons',
  'quarantined': 'reason!',
  'released': 'reason!',
  'missing': 'lastSeen',
  'found': 'placeId',
  'retired': 'reason! proof',
  'sent-for-reclaim': 'shipmentId! gross!',
  'reclaimed': 'shipmentId! theirGross acceptedNet grade price pricePer reported',
  'sent-for-test': 'lotId!',
  'retested': 'month! method! result! requalifierId! rin suffix newTare',
  'exchanged': 'otherCylinderId! direction! exchangeId! firmId!',
  'countersigned': 'eventId!',
  'corrected': 'eventId! reason! instead',
}
const MASSES = ['gross', 'grossBefore', 'grossAfter', 'newTare', 'theirGross', 'acceptedNet']

const UUID = /^(?:[0-9a-f]{8}-[0-9a-f]{4}-[1-8][0-9a-f]{3}-[89ab][0-9a-f]{3}-[0-9a-f]{12}|0{8}-0{4}-0{4}-0{4}-0{12}|f{8}-f{4}-f{4}-f{4}-f{12})$/i
const isId = value => typeof value === 'string' && UUID.test(value)
const isOneOf = (...words) => value => words.includes(value)
const isLine = longest => value => typeof value === 'string' && value.trim() !== '' && value.trim().length <= longest
  && !/[\p{Cc}\p{Cs}\u202A-\u202E\u2066-\u2069]/u.test(value.trim())
const isFigure = (least, most) => value => typeof value === 'number' && value >= least && value <= most
const isName = value => typeof value === 'string' && value.length <= 20 && /^R[A-Z]{0,2}-\d{1,4}[A-Za-z0-9]*(?:\([EZ]\))?$/.test(value)
const isCondition = isOneOf('clean', 'suspect', 'burnt', 'mixed', 'unknown')
const isInstant = value => typeof value === 'string' && /^\d{4}-\d\d-\d\dT\d\d:\d\d(?::\d\d(?:\.\d+)?)?(?:Z|[+-]\d\d:\d\d)$/.test(value) && Number.isFinite(Date.parse(value))
const isMonth = value => typeof value === 'string' && /^(?:19|20|21)\d\d-(?:0[1-9]|1[0-2])$/.test(value)
/** Whether a value is an object with these fields and no others; those with a question mark may be left out. */
const isObject = fields => value => typeof value === 'object' && value !== null && !Array.isArray(value)
  && Object.keys(value).every(name => Object.hasOwn(fields, name) || Object.hasOwn(fields, `${name}?`))
  && Object.entries(fields).every(([name, isRight]) => name.endsWith('?')
    ? value[name.slice(0, -1)] === undefined || isRight(value[name.slice(0, -1)])
    : isRight(value[name]))
const isVacuum = value => isObject({ microns: isFigure(0, 1_000_000) })(value) || isObject({ 'inHg': isFigure(0, 32), 'barometerInHg?': isFigure(15, 32) })(value)
const isVerdict = value => isObject({ refrigerant: name => name === null || isName(name), condition: isCondition })(value)
  && (value.refrigerant !== null || value.condition !== 'clean')
const isReadings = value => Array.isArray(value) && value.length <= 200 && value.every(isObject({ at: isInstant, gross: isMass }))
const isContents = value => value === 'evacuated' || value === 'unknown' || isObject({ refrigerant: isName, condition: isCondition })(value)
const isStamped = value => value === null || (isMass(value) && Math.round(exactGrams(value)) > 0)
const isStamp = value => typeof value === 'object' && value !== null && isStamped(value.tareWeight) && isStamped(value.waterCapacity)
  && [undefined, true, false].includes(value.tareIncludesValve)

/** What a field holds wherever it stands, of the kinds that bear on what is in a cylinder. */
const FORMS = {
  ...Object.fromEntries(MASSES.map(name => [name, isMass])),
  ...Object.fromEntries([
    'fromFirmId', 'ownerId', 'toPlaceId', 'toHolderId', 'scaleId', 'jobId', 'ownerOfRefrigerantId', 'counterpartId', 'transferId', 'placeId', 'shipmentId',
    'lotId', 'requalifierId', 'otherCylinderId', 'toOwnerId', 'exchangeId', 'firmId',
  ].map(name => [name, isId])),
  newTare: value => isMass(value) && isStamped(value),
  refrigerant: value => value === null || isName(value),
  dedicatedTo: isName,
  condition: isCondition,
  contents: isContents,
  stamp: isStamp,
  vacuum: isVacuum,
  verdict: isVerdict,
  readings: isReadings,
  purpose: isOneOf('same-system', 'same-owner', 'sampling', 'other'),
  phase: isOneOf('liquid', 'vapour'),
  cause: isOneOf('leak', 'relief', 'hose', 'accident', 'unknown'),
  direction: isOneOf('out', 'in'),
  ownership: isOneOf('own', 'rental', 'deposit', 'customer'),
  looked: isOneOf(true),
  purged: isOneOf(true),
  ownerConsents: isOneOf(true),
  reached: isObject({ 'vacuum': isVacuum, 'heldMinutes?': isFigure(0, 10_000) }),
  unavoidable: isOneOf(true, false),
  paper: isLine(120),
  grade: isLine(80),
  suffix: isLine(3),
  rin: value => typeof value === 'string' && /^[A-Z0-9]{4}$/.test(value),
  price: isFigure(-1_000_000_000, 1_000_000_000),
  pricePer: isOneOf('lb', 'kg'),
  reported: isObject({ 'linkId?': isId, 'name?': isLine(80), 'at?': isInstant }),
  month: isMonth,
}
/** Fields that hold something else in one kind than in another. */
const FORMS_OF = {
  filled: { method: isLine(40) },
  checked: { method: isOneOf('pressure', 'identifier', 'laboratory') },
  retested: { method: isOneOf('volumetric', 'proof', 'visual'), result: isOneOf('passed', 'rejected', 'condemned') },
}

/** Whether details could be those of a kind: what a correction puts in place counts only then. */
function fits(kind, details) {
  if (typeof details !== 'object' || details === null || Array.isArray(details)) return false
  const fields = FIELDS[kind].split(' ')
  const names = fields.map(field => field.replace('!', ''))
  const forms = { ...FORMS, ...FORMS_OF[kind] }
  return fields.every(field => !field.endsWith('!') || details[field.slice(0, -1)] !== undefined)
    && Object.keys(details).every(name => names.includes(name))
    && Object.entries(details).every(([name, value]) => value === undefined || !Object.hasOwn(forms, name) || forms[name](value))
    && (kind !== 'checked' || (details.method === 'pressure') === (details.verdict === undefined))
}

function eventOf(row) {
  return {
    id: row.id.toLowerCase(), kind: row.kind, details: JSON.parse(row.body).details ?? {}, placeId: row.place_id,
    at: row.effective_at, claimed: row.occurred_at - row.clock_skew_seconds * 1000, deviceId: row.device_id, deviceSeq: row.device_seq,
  }
}

function inOrderOfEffect(events) {
  const text = (a, b) => a === b ? 0 : a < b ? -1 : 1
  return [...events].sort((a, b) =>
    a.at - b.at || a.claimed - b.claimed || text(a.deviceId, b.deviceId) || a.deviceSeq - b.deviceSeq || text(a.id, b.id))
}

/** The events that count, with what corrections made of them, in order of effect. */
function corrected(events) {
  const ordered = inOrderOfEffect(events)
  const corrections = ordered.filter(({ kind }) => kind === 'corrected')
  const target = ({ details }) => String(details.eventId).toLowerCase()
  const settled = new Map()
  const beingSettled = new Set()

  // The latest of the corrections that names the event and fits it; undefined where there is none.
  function mended(event, candidates) {
    for (const one of [...candidates].reverse()) {
      const by = event.kind === 'corrected' ? asItCounts(one) : one
      if (by === null || by.id === event.id || target(by) !== event.id) continue
      if (by.details.instead === undefined) {
        if (event.kind !== 'registered') return null
      }
      else if (fits(event.kind, by.details.instead)) return { ...event, details: by.details.instead }
    }
    return undefined
  }

  // A correction as later corrections left it; null where one took it out.
  function asItCounts(correction) {
    if (settled.has(correction.id)) return settled.get(correction.id)
    if (beingSettled.has(correction.id)) return correction
    beingSettled.add(correction.id)
    const mayName = corrections.filter(one => target(one) === correction.id
      || corrections.some(other => target(other) === one.id && String(other.details.instead?.eventId).toLowerCase() === correction.id))
    const outcome = mended(correction, mayName)
    beingSettled.delete(correction.id)
    settled.set(correction.id, outcome === undefined ? correction : outcome)
    return settled.get(correction.id)
  }

  const counting = corrections.map(asItCounts).filter(one => one !== null)
  return ordered.flatMap((event) => {
    if (event.kind === 'corrected') return []
    const outcome = mended(event, counting.filter(one => target(one) === event.id))
    return outcome === undefined ? [event] : outcome === null ? [] : [outcome]
  })
}

/** The net in grams after the events; null where nobody can know it. */
function netOf(events, scales, firmPlaces) {
  const standing = corrected(events)
  const first = standing.find(({ kind }) => kind === 'registered')
  const now = {
    tare: null, net: null, isNothing: false, isBack: false, place: null, away: null,
    // The reading that the net rests on, and how far that may be off.
    gross: null, off: null,
  }

  function read(reading, scaleId) {
    const gross = Math.round(exactGrams(reading))
    const off = accuracy(gross, scaleId === undefined ? undefined : scales.get(String(scaleId).toLowerCase()))
    const above = now.tare === null ? null : gross - Math.round(now.tare)
    return {
      gross, off, isBelow: above !== null && above < -off, isAt: above !== null && Math.abs(above) <= off, isAbove: above !== null && above > off,
      net: above === null || above < -off ? null : Math.max(0, above),
    }
  }
  function restOn(reading) {
    now.gross = reading.gross
    now.off = now.net === null ? null : reading.off
  }
  function restOnNothing() {
    now.gross = null
    now.off = null
  }
  function becomeNothing() {
    now.isNothing = true
    now.isBack = false
  }
  function loseNet() {
    now.net = null
    restOnNothing()
  }
  function weigh(gross, scaleId) {
    const reading = read(gross, scaleId)
    if (reading.isAbove) now.isNothing = false
    const isEmptyBack = now.isBack && reading.isAt
    now.net = isEmptyBack || (now.isNothing && reading.isAt) ? 0 : reading.net
    if (isEmptyBack) becomeNothing()
    restOn(reading)
  }
  function takeIn({ grossBefore, grossAfter, scaleId }) {
    if (grossBefore) {
      const before = read(grossBefore, scaleId)
      now.net = before.net
      restOn(before)
    }
    now.isNothing = false
    now.isBack = false
    const after = read(grossAfter, scaleId)
    now.net = after.net
    restOn(after)
  }
  function comeBack(event) {
    // Nobody knows what it comes back with.
    if (now.away?.at === 'reclaim' || now.away?.at === 'given') {
      now.isNothing = false
      now.isBack = true
      now.net = null
      restOnNothing()
    }
    now.away = null
    now.place = event.placeId
    if (event.details.gross) weigh(event.details.gross)
  }
  function emptied({ grossAfter, vacuum }) {
    const isDeep = vacuum !== undefined && (vacuum.microns !== undefined
      ? vacuum.microns <= 1000
      : Math.abs((vacuum.barometerInHg ?? 29.92) - vacuum.inHg) <= 1 + 1e-9)
    const reading = grossAfter ? read(grossAfter) : null
    if (!isDeep || reading?.isAbove) {
      if (grossAfter) weigh(grossAfter)
      else if (!now.isNothing) loseNet()
      return
    }
    now.net = now.tare === null || reading?.isBelow ? null : 0
    if (reading) restOn(reading)
    else restOnNothing()
    becomeNothing()
  }
  function retested({ method, newTare }) {
    if (method !== 'visual') {
      now.net = 0
      becomeNothing()
      restOnNothing()
    }
    if (now.away?.at === 'test') now.away = null
    if (!newTare) return
    now.tare = exactGrams(newTare)
    if (now.gross === null || now.isNothing) return
    const off = now.off ?? accuracy(now.gross)
    const net = now.gross - Math.round(now.tare)
    now.net = net < -off ? null : Math.max(0, net)
    now.off = now.net === null ? null : off
  }
  function registered({ details, placeId }) {
    const { stamp, contents, gross } = details
    now.tare = stamp.tareWeight === null || stamp.tareIncludesValve === false ? null : exactGrams(stamp.tareWeight)
    now.place = placeId
    if (contents === 'evacuated') becomeNothing()
    if (gross) weigh(gross)
    else if (contents === 'evacuated') now.net = 0
  }

  for (const event of first ? [first, ...standing.filter(one => one !== first)] : standing) {
    const { kind, details } = event
    if (['moved', 'handed-over', 'weighed', 'filled', 'drawn', 'transferred'].includes(kind)) now.away = null
    if (kind === 'registered' && event === first) registered(event)
    else if (kind === 'received' || kind === 'returned') comeBack(event)
    else if (kind === 'moved') now.place = String(details.toPlaceId).toLowerCase()
    else if (kind === 'weighed') weigh(details.gross, details.scaleId)
    else if (kind === 'filled' || (kind === 'transferred' && details.direction === 'in')) takeIn(details)
    else if (kind === 'drawn') weigh(details.grossAfter)
    else if (kind === 'transferred') {
      if (details.grossBefore) weigh(details.grossBefore)
      weigh(details.grossAfter)
    }
    else if (kind === 'exchanged' && details.direction === 'in') comeBack(event)
    else if (kind === 'exchanged') {
      now.away = { at: 'given' }
      now.place = firmPlaces.get(String(details.firmId).toLowerCase()) ?? null
    }
    else if (kind === 'emptied') emptied(details)
    else if (kind === 'retested') retested(details)
    else if (kind === 'lost') {
      if (details.grossAfter) weigh(details.grossAfter)
      else if (!now.isNothing) loseNet()
    }
    else if (kind === 'checked' && details.method !== 'pressure') {
      if (now.isNothing) loseNet()
      now.isNothing = false
      now.isBack = false
    }
    else if (kind === 'found') {
      const place = details.placeId === undefined ? now.place : String(details.placeId).toLowerCase()
      if (place !== now.place) now.away = null
      now.place = place
    }
    else if (kind === 'sent-for-reclaim') {
      weigh(details.gross)
      now.away = { at: 'reclaim', list: String(details.shipmentId).toLowerCase() }
      now.place = event.placeId
    }
    else if (kind === 'sent-for-test') {
      now.away = { at: 'test' }
      now.place = event.placeId
    }
    else if (kind === 'reclaimed' && now.away?.at === 'reclaim' && now.away.list === String(details.shipmentId).toLowerCase()) {
      now.net = 0
      becomeNothing()
      restOnNothing()
    }
  }
  return now.net
}

function checkNet(rows, told) {
  const name = `cylinder ${told.id}`
  const strange = rows.find(({ kind }) => FIELDS[kind] === undefined)
  if (strange) return fault(`${name}: this program does not know the kind of event "${strange.kind}", so its net was not compared`)
  const grams = value => value === null ? 'not known' : `${value} g`
  try {
    const net = netOf(rows.map(eventOf), scales, firmPlaces)
    if (net !== told.netGrams) fault(`${name}: its events give a net of ${grams(net)}, the firm's list says ${grams(told.netGrams)}`)
  }
  catch (error) {
    fault(`${name}: its events cannot be read (${error.message})`)
  }
}

// The file

const { file, keys: given } = argumentsOf(process.argv.slice(2))
let header = null
let keys = []
let seen = null
let rows = []
let lastId = ''
let events = 0
let cylinders = 0
let end = null
const checkpoints = []
const scales = new Map()
const firmPlaces = new Map()

function begin(line) {
  const isText = value => typeof value === 'string'
  const isOurs = line.format === 'custody-log' && line.version === 1 && isText(line.origin) && isText(line.publicKey)
    && Array.isArray(line.formerKeys) && line.formerKeys.every(isText)
    && Array.isArray(line.columns) && [...HASHED, 'hash'].every(column => line.columns.includes(column))
  if (!isOurs) giveUp('This is no export of a custody log in the form that this program knows (version 1).')
  if (!Number.isSafeInteger(line.events) || line.events < 0 || line.events > MOST_EVENTS) giveUp('The export does not say how many events it holds.')
  header = line
  const trusted = given.length > 0 ? given : [line.publicKey, ...line.formerKeys]
  keys = trusted.map(publicKey)
  if (keys.includes(null)) giveUp('A key is none: it must be the whole text, as in custody-log/…+1a2b3c4d+AQ…')
  seen = new Uint8Array(Math.ceil((line.events + 1) / 8))
  if (line.seq !== line.events) fault(`${line.seq - line.events} numbers are missing: the log came to ${line.seq}, and holds ${line.events} events`)
}

function takeEvent(values) {
  const isRow = Array.isArray(values) && values.length === header.columns.length && values.every(value => value === null || typeof value !== 'object')
  if (!isRow) return fault('A line of the log does not have its columns.')
  const row = Object.fromEntries(header.columns.map((column, index) => [column, values[index]]))
  if (rows.length > 0 && rows[0].cylinder_id !== row.cylinder_id) fault(`cylinder ${rows[0].cylinder_id}: its net is missing`)
  if (rows.length > 0 && rows[0].cylinder_id !== row.cylinder_id) rows = []
  if (rows.length === 0) {
    if (lastId !== '' && !(row.cylinder_id > lastId)) fault(`cylinder ${row.cylinder_id}: it does not stand in its place`)
    lastId = row.cylinder_id
  }
  rows.push(row)
  events++
  if (!Number.isSafeInteger(row.seq) || row.seq < 1 || row.seq > header.events) return fault(`number ${row.seq}: there are only ${header.events} events`)
  const bit = 1 << row.seq % 8
  if (seen[row.seq >> 3] & bit) fault(`number ${row.seq}: it is there twice`)
  seen[row.seq >> 3] |= bit
}

function takeCylinder(told) {
  cylinders++
  if (rows.length === 0 || rows[0].cylinder_id !== told.id) return fault(`cylinder ${told.id}: its lines are missing`)
  checkChain(rows)
  addToTrees(rows, checkpoints)
  checkNet(rows, told)
  rows = []
}

for await (const text of createInterface({ input: createReadStream(file).on('error', error => giveUp(error.message)), crlfDelay: Infinity })) {
  let line
  try {
    line = JSON.parse(text)
  }
  catch {
    fault('A line of the file is no JSON.')
    continue
  }
  if (typeof line !== 'object' || line === null) fault('A line of the file says nothing.')
  else if (!header) begin(line)
  else if (line.scale) scales.set(line.scale.id, line.scale)
  else if (line.firm) firmPlaces.set(line.firm.id, line.firm.placeId)
  else if (typeof line.checkpoint === 'string') checkpoints.push(readCheckpoint(line.checkpoint, keys))
  else if (line.checkpoint !== undefined) fault('A checkpoint is no text.')
  else if (line.event) takeEvent(line.event)
  else if (line.cylinder) takeCylinder(line.cylinder)
  else if (line.end) end = line.end
}

if (!header) giveUp('The file is empty.')
if (!end) fault('The file breaks off: its last line is missing.')
else if (end.events !== events || end.cylinders !== cylinders || end.checkpoints !== checkpoints.length) fault('The file does not hold as much as its last line says.')
for (let seq = 1, told = 0; seq <= header.events && told < 20; seq++) {
  if (seen[seq >> 3] & (1 << seq % 8)) continue
  fault(`number ${seq}: it is missing`)
  told++
}
checkCheckpoints(checkpoints, header.origin)
for (const one of checkpoints) {
  if (one.counted !== one.events || one.leaves !== one.cylinders) {
    fault(`checkpoint ${one.number}: it was signed over ${one.events} events of ${one.cylinders} cylinders; the log now holds ${one.counted} of ${one.leaves} up to there`)
  }
  if (rootOf(one.tree).toString('base64') !== one.root) fault(`checkpoint ${one.number}: the log up to there is not what was signed`)
}

console.log(`${events} events of ${cylinders} cylinders, ${checkpoints.length} checkpoints: ${faults === 0 ? 'no fault found.' : `${faults} ${faults === 1 ? 'fault' : 'faults'} found.`}`)
if (given.length === 0) console.log(`The key came with the export: ${header.publicKey}\nCompare it with the one that you were given, or name that one with --key.`)
process.exitCode = faults === 0 ? 0 : 1
