import { sql } from 'drizzle-orm'
import { blob, index, integer, primaryKey, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core'
import type { MassReading } from '../utils/quantity/mass'
import type { ScaleStep } from '../utils/quantity/scale'
import type { Appliance, Circumstances, MachineMade } from '../utils/recovery/types'

// Instants are UTC milliseconds, masses whole grams, flags 0 or 1, months 'YYYY-MM', ids UUIDv7 in lower case.

/** The contractor itself: one row. */
export const firm = sqliteTable('firm', {
  id: text('id').primaryKey(),
  name: text('name').notNull(),
  telephone: text('telephone').notNull(),
  timeZone: text('time_zone').notNull(),
  units: text('units', { enum: ['lb', 'lb-oz', 'kg'] }).notNull(),
  /** As papers name the shipper. */
  address: text('address'),
  /** Who answers in an emergency while a load is on its way; a service's contract where one answers. Source: 49 CFR 172.604. */
  emergencyTelephone: text('emergency_telephone'),
  emergencyContract: text('emergency_contract'),
  createdAt: integer('created_at').notNull(),
})

/**
 * Rules of the firm from a date on; the row in force is the latest that has begun. Append-only: triggers refuse UPDATE
 * and DELETE. A rule that has not begun is taken back by a row of its own, the withdrawal.
 */
export const settings = sqliteTable('settings', {
  id: text('id').primaryKey(),
  kind: text('kind', { enum: ['fill-policy', 'retest', 'withdrawal'] }).notNull(),
  fromAt: integer('from_at').notNull(),
  value: text('value', { mode: 'json' }).notNull(),
  reason: text('reason').notNull(),
  setBy: text('set_by').notNull(),
  setAt: integer('set_at').notNull(),
}, table => [index('settings_kind_from').on(table.kind, table.fromAt)])

export const people = sqliteTable('people', {
  id: text('id').primaryKey(),
  /** Lower case. */
  email: text('email').notNull().unique(),
  name: text('name').notNull(),
  roles: text('roles', { mode: 'json' }).$type<string[]>().notNull(),
  trainee: integer('trainee', { mode: 'boolean' }).notNull().default(false),
  /** What is written of a certification beside its type and number; from before these were asked for, all of it. */
  certification: text('certification'),
  certificationType: text('certification_type', { enum: ['I', 'II', 'III', 'universal'] }),
  certificationNumber: text('certification_number'),
  /** Who usually supervises this trainee. */
  supervisorId: text('supervisor_id'),
  units: text('units', { enum: ['lb', 'lb-oz', 'kg'] }).notNull(),
  /** null until the invitation is taken up. */
  passwordHash: text('password_hash'),
  active: integer('active', { mode: 'boolean' }).notNull().default(true),
  createdAt: integer('created_at').notNull(),
})

/** Who is signed in where. The cookie holds a secret; only its hash is here. */
export const sessions = sqliteTable('sessions', {
  secretHash: text('secret_hash').primaryKey(),
  personId: text('person_id').notNull().references(() => people.id),
  createdAt: integer('created_at').notNull(),
  lastSeenAt: integer('last_seen_at').notNull(),
}, table => [index('sessions_person').on(table.personId)])

/** One-time links: the first set-up, an invitation, a new password. Only the token's hash is here. */
export const oneTimeLinks = sqliteTable('one_time_links', {
  tokenHash: text('token_hash').primaryKey(),
  purpose: text('purpose', { enum: ['set-up', 'invitation'] }).notNull(),
  personId: text('person_id').references(() => people.id),
  createdAt: integer('created_at').notNull(),
  expiresAt: integer('expires_at').notNull(),
  usedAt: integer('used_at'),
}, table => [index('one_time_links_person').on(table.personId)])

/** Outgoing mail: kept here, sent when a mail server is set. */
export const mail = sqliteTable('mail', {
  id: text('id').primaryKey(),
  recipient: text('recipient').notNull(),
  subject: text('subject').notNull(),
  body: text('body').notNull(),
  createdAt: integer('created_at').notNull(),
  sentAt: integer('sent_at'),
  error: text('error'),
})

/** The papers that go with a letter. */
export const mailAttachments = sqliteTable('mail_attachments', {
  mailId: text('mail_id').notNull().references(() => mail.id),
  position: integer('position').notNull(),
  name: text('name').notNull(),
  mediaType: text('media_type').notNull(),
  content: blob('content', { mode: 'buffer' }).notNull(),
}, table => [primaryKey({ columns: [table.mailId, table.position] })])

/** Sign-ins, refusals and changes of people: who, when, what; never a password. Apart from the custody log. */
export const securityLog = sqliteTable('security_log', {
  id: text('id').primaryKey(),
  at: integer('at').notNull(),
  personId: text('person_id'),
  what: text('what').notNull(),
  subject: text('subject'),
})

export const firms = sqliteTable('firms', {
  id: text('id').primaryKey(),
  name: text('name').notNull(),
  kind: text('kind', { enum: ['reclaimer', 'requalifier', 'supplier', 'customer', 'carrier'] }).notNull(),
  telephone: text('telephone'),
  email: text('email'),
  address: text('address'),
  /** A requalifier's identification number, as stamped. */
  rin: text('rin'),
  active: integer('active', { mode: 'boolean' }).notNull().default(true),
  createdAt: integer('created_at').notNull(),
})

/**
 * What a reclaimer takes, from a day on, and at what minimum; the row that counts on a day is the latest that has begun
 * and was not withdrawn. Rows are only added and withdrawn.
 */
export const firmTerms = sqliteTable('firm_terms', {
  id: text('id').primaryKey(),
  firmId: text('firm_id').notNull().references(() => firms.id),
  /** 'YYYY-MM-DD', in the firm's time zone. */
  fromDay: text('from_day').notNull(),
  terms: text('terms', { mode: 'json' }).notNull(),
  recordedBy: text('recorded_by').notNull(),
  recordedAt: integer('recorded_at').notNull(),
  withdrawnBy: text('withdrawn_by'),
  withdrawnAt: integer('withdrawn_at'),
}, table => [index('firm_terms_firm').on(table.firmId, table.fromDay)])

/** What a reclaimer pays for a refrigerant in a condition, or charges, from a day to another. Rows are only added and withdrawn. */
export const firmPrices = sqliteTable('firm_prices', {
  id: text('id').primaryKey(),
  firmId: text('firm_id').notNull().references(() => firms.id),
  /** A designation; null for contents whose refrigerant is not known or mixed. */
  refrigerant: text('refrigerant'),
  condition: text('condition').notNull(),
  fromDay: text('from_day').notNull(),
  /** The last day it holds; null where no end was said. */
  untilDay: text('until_day'),
  /** Thousandths of the currency for each unit of mass; negative is charged. */
  mills: integer('mills').notNull(),
  per: text('per', { enum: ['lb', 'kg'] }).notNull(),
  recordedBy: text('recorded_by').notNull(),
  recordedAt: integer('recorded_at').notNull(),
  withdrawnBy: text('withdrawn_by'),
  withdrawnAt: integer('withdrawn_at'),
}, table => [index('firm_prices_firm').on(table.firmId, table.refrigerant, table.condition)])

export const places = sqliteTable('places', {
  id: text('id').primaryKey(),
  name: text('name').notNull(),
  kind: text('kind', { enum: ['shop', 'rack', 'van', 'site', 'firm'] }).notNull(),
  parentId: text('parent_id'),
  /** The firm whose place it is; each firm has one. */
  firmId: text('firm_id').references(() => firms.id),
  /** A van's technician. */
  technicianId: text('technician_id').references(() => people.id),
  active: integer('active', { mode: 'boolean' }).notNull().default(true),
  createdAt: integer('created_at').notNull(),
}, table => [uniqueIndex('places_firm').on(table.firmId)])

/** What a van carries beside cylinders, as its crew last said; every saying is kept, the latest counts. */
export const vanMaterials = sqliteTable('van_materials', {
  id: text('id').primaryKey(),
  vanId: text('van_id').notNull().references(() => places.id),
  /** Gross of all of it together, as entered. */
  gross: text('gross', { mode: 'json' }).$type<MassReading>().notNull(),
  note: text('note').notNull(),
  saidBy: text('said_by').notNull(),
  saidAt: integer('said_at').notNull(),
}, table => [index('van_materials_van').on(table.vanId, table.saidAt)])

/** A van's return: what was found of what it should hold. The latest of a van says what is to be looked for. */
export const vanCheckIns = sqliteTable('van_check_ins', {
  id: text('id').primaryKey(),
  vanId: text('van_id').notNull().references(() => places.id),
  /** Ids of cylinders that were scanned. */
  found: text('found', { mode: 'json' }).$type<string[]>().notNull(),
  /** Ids of cylinders that ought to have come back and did not. */
  missing: text('missing', { mode: 'json' }).$type<string[]>().notNull(),
  checkedBy: text('checked_by').notNull(),
  checkedAt: integer('checked_at').notNull(),
}, table => [index('van_check_ins_van').on(table.vanId, table.checkedAt)])

/** The scales of the firm. A trigger refuses another accuracy: what was weighed on a scale rests on it. */
export const scales = sqliteTable('scales', {
  id: text('id').primaryKey(),
  name: text('name').notNull(),
  /** As it was entered; null where only whole grams are known. */
  accuracyEntered: text('accuracy_entered', { mode: 'json' }).$type<ScaleStep>(),
  /** Rounded up. */
  accuracyGrams: integer('accuracy_grams').notNull(),
  /** Hundredths of a percent of the reading. */
  accuracyBasisPoints: integer('accuracy_basis_points').notNull(),
  /** Calendar day 'YYYY-MM-DD' of the last check, if known. */
  lastCheckOn: text('last_check_on'),
  active: integer('active', { mode: 'boolean' }).notNull().default(true),
})

/** The job that a line of the log names, or that a correction names in its place, in SQL: in the words of the index that finds it. A line that was tampered with may be no JSON. */
export const JOB_NAMED = `CASE WHEN json_valid(body) THEN CASE WHEN kind = 'corrected' THEN lower(body ->> '$.details.instead.jobId') ELSE body ->> '$.details.jobId' END END`

/**
 * The custody log. Append-only: triggers refuse UPDATE and DELETE, and an INSERT that would replace a row is ignored.
 * Nothing references it with a cascade.
 */
export const custodyEvents = sqliteTable('custody_events', {
  /** The order of recording, over all cylinders. */
  seq: integer('seq').primaryKey({ autoIncrement: true }),
  id: text('id').notNull().unique(),
  cylinderId: text('cylinder_id').notNull(),
  /** 1..n within the cylinder, by arrival. */
  version: integer('version').notNull(),
  deviceId: text('device_id').notNull(),
  deviceSeq: integer('device_seq').notNull(),
  kind: text('kind').notNull(),
  /** As the author's clock had it. */
  occurredAt: integer('occurred_at').notNull(),
  occurredOffsetMinutes: integer('occurred_offset_minutes').notNull(),
  clockSkewSeconds: integer('clock_skew_seconds').notNull(),
  effectiveAt: integer('effective_at').notNull(),
  recordedAt: integer('recorded_at').notNull(),
  actorId: text('actor_id').notNull(),
  postedBy: text('posted_by').notNull(),
  supervisorId: text('supervisor_id'),
  trainee: integer('trainee', { mode: 'boolean' }).notNull(),
  placeId: text('place_id'),
  /** Canonical JSON (RFC 8785) of the event as understood: readings as entered, ids in lower case. */
  body: text('body').notNull(),
  /** SHA-256 (hexadecimal) of the canonical JSON as received: by it a repetition is known. */
  contentHash: text('content_hash').notNull(),
  /** hash of the cylinder's version before this one; '' for the first. */
  prevHash: text('prev_hash').notNull(),
  hash: text('hash').notNull(),
}, table => [
  uniqueIndex('custody_events_cylinder_version').on(table.cylinderId, table.version),
  index('custody_events_supervised').on(table.supervisorId).where(sql`trainee = 1`),
  // What was said once and is not said any more is found along it.
  index('custody_events_corrected').on(table.cylinderId).where(sql`kind = 'corrected'`),
  index('custody_events_job').on(sql`(${sql.raw(JOB_NAMED)})`).where(sql`(${sql.raw(JOB_NAMED)}) IS NOT NULL`),
])

/**
 * Signed checkpoints of the custody log. Append-only like the log itself; the key that signs them is never in here.
 */
export const checkpoints = sqliteTable('checkpoints', {
  /** Counts up from 1. */
  number: integer('number').primaryKey(),
  /** The signed note: all that a checkpoint says stands in it. */
  note: text('note').notNull(),
  /** Who asked for it; null for the daily one. */
  askedBy: text('asked_by'),
})

/** A cache of the fold: one row a cylinder. Made again from the log by `npm run rebuild`. */
export const cylinders = sqliteTable('cylinders', {
  id: text('id').primaryKey(),
  version: integer('version').notNull(),
  labelCode: text('label_code'),
  serial: text('serial'),
  spec: text('spec'),
  placeId: text('place_id'),
  holderId: text('holder_id'),
  ownerId: text('owner_id'),
  refrigerant: text('refrigerant'),
  condition: text('condition').notNull(),
  lifecycle: text('lifecycle').notNull(),
  /** A firm has it in exchange for another: it counts in the fleet no more. */
  givenAway: integer('given_away', { mode: 'boolean' }).notNull().default(false),
  nothingInIt: integer('nothing_in_it', { mode: 'boolean' }).notNull(),
  netGrams: integer('net_grams'),
  fillLimitGrams: integer('fill_limit_grams'),
  governingRule: text('governing_rule'),
  roomGrams: integer('room_grams'),
  stopWeightGrams: integer('stop_weight_grams'),
  /** Not rounded: the screen rounds it down to the scale's division. */
  exactStopWeight: text('exact_stop_weight'),
  tareWeightGrams: integer('tare_weight_grams'),
  waterCapacityGrams: integer('water_capacity_grams'),
  /** null where no retest is required or none is known; retest_state says which. */
  dueMonth: text('due_month'),
  retestState: text('retest_state', { enum: ['dated', 'unknown', 'not-required'] }).notNull(),
  lastEventAt: integer('last_event_at'),
  lastEventKind: text('last_event_kind'),
  /** Last event that saw the cylinder, for "not seen for n days". */
  lastSeenAt: integer('last_seen_at'),
  /** Codes of the findings that do not depend on the date, each between spaces: ' overfill wet '. */
  findingCodes: text('finding_codes').notNull(),
  /** 2 = a stop stands whatever the date, 1 = a caution, 0 = none. */
  severity: integer('severity').notNull(),
  state: text('state').notNull(),
  /** Names the firm's rules that the columns rest on; a row under other rules than those in force is made anew. */
  ruledBy: text('ruled_by').notNull().default(''),
}, table => [
  // A list is read in the order of one of these, a page at a time: each ends with the id, on which a page's cursor stands.
  index('cylinders_label').on(table.labelCode, table.id),
  index('cylinders_serial').on(table.serial, table.id),
  index('cylinders_place').on(table.placeId, table.id),
  index('cylinders_holder').on(table.holderId, table.id),
  index('cylinders_owner').on(table.ownerId, table.id),
  index('cylinders_refrigerant').on(table.refrigerant, table.id),
  index('cylinders_condition').on(table.condition, table.id),
  index('cylinders_lifecycle').on(table.lifecycle, table.id),
  index('cylinders_net').on(table.netGrams, table.id),
  index('cylinders_room').on(table.roomGrams, table.id),
  index('cylinders_stop_weight').on(table.stopWeightGrams, table.id),
  index('cylinders_due').on(table.dueMonth, table.id),
  index('cylinders_last_event').on(table.lastEventAt, table.id),
  index('cylinders_last_seen').on(table.lastSeenAt, table.id),
  index('cylinders_severity').on(table.severity, table.id),
  index('cylinders_ruled_by').on(table.ruledBy),
  // The total of the fleet is counted along it.
  index('cylinders_given_away').on(table.givenAway),
])

/** A cache of the fold: every change of net, signed. */
export const movements = sqliteTable('movements', {
  cylinderId: text('cylinder_id').notNull(),
  eventId: text('event_id').notNull(),
  ordinal: integer('ordinal').notNull(),
  cause: text('cause').notNull(),
  refrigerant: text('refrigerant'),
  ownerId: text('owner_id'),
  grams: integer('grams').notNull(),
  at: integer('at').notNull(),
  apart: integer('apart', { mode: 'boolean' }).notNull(),
}, table => [
  primaryKey({ columns: [table.cylinderId, table.eventId, table.ordinal] }),
  // Holds all that a balance sums, in the order in which it groups.
  index('movements_balance').on(table.refrigerant, table.ownerId, table.cause, table.apart, table.at, table.grams),
])

/** A cache of the fold: every change of what is held in stock, and of how surely that is known. */
export const stockChanges = sqliteTable('stock_changes', {
  cylinderId: text('cylinder_id').notNull(),
  eventId: text('event_id').notNull(),
  ordinal: integer('ordinal').notNull(),
  refrigerant: text('refrigerant'),
  ownerId: text('owner_id'),
  grams: integer('grams').notNull(),
  /** In the number of cylinders whose contents are not known. */
  notKnown: integer('not_known').notNull(),
  /** Squared grams: of the weights that the known contents rest on, and of the differences found by weighing. */
  weighedVariance: integer('weighed_variance').notNull(),
  foundVariance: integer('found_variance').notNull(),
  /** The same as they count for all owners together, whose parts of one weight err alike. */
  weighedTogether: integer('weighed_together').notNull().default(0),
  foundTogether: integer('found_together').notNull().default(0),
  at: integer('at').notNull(),
  apart: integer('apart', { mode: 'boolean' }).notNull(),
}, table => [
  primaryKey({ columns: [table.cylinderId, table.eventId, table.ordinal] }),
  index('stock_changes_balance').on(table.refrigerant, table.ownerId, table.apart, table.at, table.grams, table.notKnown, table.weighedVariance, table.foundVariance, table.weighedTogether, table.foundTogether),
])

/** A cache of the fold: each cylinder's halves of what happened between two. */
export const halves = sqliteTable('halves', {
  eventId: text('event_id').primaryKey(),
  cylinderId: text('cylinder_id').notNull(),
  /** The cylinder that it names; it need not be known. */
  otherId: text('other_id').notNull(),
  /** In order of effect within the cylinder, from 0. */
  position: integer('position').notNull(),
  half: text('half', { mode: 'json' }).notNull(),
}, table => [index('halves_cylinder').on(table.cylinderId, table.position), index('halves_other').on(table.otherId, table.cylinderId, table.position)])

/** Codes that were minted here. A code may be printed before it is on a cylinder. */
export const labels = sqliteTable('labels', {
  code: text('code').primaryKey(),
  mintedAt: integer('minted_at').notNull(),
  mintedBy: text('minted_by').notNull(),
})

/** A cache of the `labelled` events: which cylinders claim a code. The earliest in effect has it. */
export const labelClaims = sqliteTable('label_claims', {
  eventId: text('event_id').primaryKey(),
  code: text('code').notNull(),
  cylinderId: text('cylinder_id').notNull(),
  effectiveAt: integer('effective_at').notNull(),
  deviceId: text('device_id').notNull(),
  deviceSeq: integer('device_seq').notNull(),
}, table => [index('label_claims_code').on(table.code), index('label_claims_cylinder').on(table.cylinderId)])

/**
 * Photos that arrived, as they are kept: turned upright, of a bounded size, with nothing in them but the picture. The
 * files lie under the hash. Append-only: triggers refuse UPDATE and DELETE.
 */
export const attachments = sqliteTable('attachments', {
  /** Made by the phone, so that a photo sent twice is kept once. */
  id: text('id').primaryKey(),
  subject: text('subject', { enum: ['stamp', 'damage', 'scale', 'other'] }).notNull(),
  /** As the phone's clock had it; null where it did not say. */
  takenAt: integer('taken_at'),
  sentBy: text('sent_by').notNull(),
  arrivedAt: integer('arrived_at').notNull(),
  /** SHA-256 (hexadecimal) of the file as received: by it a repetition is known. */
  sourceHash: text('source_hash').notNull(),
  /** SHA-256 (hexadecimal) of the picture as kept. */
  contentHash: text('content_hash').notNull(),
  bytes: integer('bytes').notNull(),
  width: integer('width').notNull(),
  height: integer('height').notNull(),
})

/**
 * Photos put to an event after it was recorded; the event itself, and its hash, stay as they were. What an event names
 * itself (`photoIds`) is not repeated here. Append-only, held by triggers.
 */
export const attachmentEvents = sqliteTable('attachment_events', {
  attachmentId: text('attachment_id').notNull().references(() => attachments.id),
  eventId: text('event_id').notNull(),
  putBy: text('put_by').notNull(),
  putAt: integer('put_at').notNull(),
}, table => [primaryKey({ columns: [table.attachmentId, table.eventId] }), index('attachment_events_event').on(table.eventId)])

export const shipments = sqliteTable('shipments', {
  id: text('id').primaryKey(),
  /** Counts up from 1: what people call it. */
  number: integer('number').notNull().unique(),
  toFirmId: text('to_firm_id').notNull().references(() => firms.id),
  state: text('state', { enum: ['draft', 'ready', 'dispatched', 'arrived', 'settled', 'closed', 'cancelled'] }).notNull(),
  note: text('note'),
  createdAt: integer('created_at').notNull(),
  createdBy: text('created_by').notNull(),
  dispatchedAt: integer('dispatched_at'),
  dispatchedBy: text('dispatched_by'),
  settledAt: integer('settled_at'),
  readyAt: integer('ready_at'),
  arrivedAt: integer('arrived_at'),
  closedAt: integer('closed_at'),
  cancelledAt: integer('cancelled_at'),
  /** Who carries it: a carrier, or null for the firm's own vehicle. */
  carrierId: text('carrier_id').references(() => firms.id),
  /** What the papers said as it left, for good; null before. */
  papers: text('papers', { mode: 'json' }),
})

export const shipmentLines = sqliteTable('shipment_lines', {
  shipmentId: text('shipment_id').notNull().references(() => shipments.id),
  cylinderId: text('cylinder_id').notNull(),
  position: integer('position').notNull(),
  /** As it left: gross reading, refrigerant, condition, net. null while a draft. */
  sent: text('sent', { mode: 'json' }),
  /** As it was scanned and weighed for the papers: reading, when, by whom. null until then. */
  weighed: text('weighed', { mode: 'json' }),
  /** What the shipper classified otherwise than worked out, with the reason. */
  classification: text('classification', { mode: 'json' }),
}, table => [primaryKey({ columns: [table.shipmentId, table.cylinderId] })])

/**
 * What was done to a shipment, by our people and over its dock link: who, when, what. Append-only, held by triggers; the
 * same id sent again is the same act.
 */
export const shipmentActs = sqliteTable('shipment_acts', {
  seq: integer('seq').primaryKey({ autoIncrement: true }),
  id: text('id').notNull().unique(),
  shipmentId: text('shipment_id').notNull().references(() => shipments.id),
  kind: text('kind').notNull(),
  cylinderId: text('cylinder_id'),
  details: text('details', { mode: 'json' }).notNull(),
  /** One of ours, or null for the dock. */
  personId: text('person_id'),
  /** The dock link it came over, and the name typed there; null for ours. */
  linkId: text('link_id'),
  linkName: text('link_name'),
  /** As the device claimed. */
  occurredAt: integer('occurred_at').notNull(),
  recordedAt: integer('recorded_at').notNull(),
}, table => [index('shipment_acts_shipment').on(table.shipmentId, table.seq)])

/** Links that open one shipment to the reclaimer's dock. The token is signed; here is what ends it. */
export const dockLinks = sqliteTable('dock_links', {
  id: text('id').primaryKey(),
  shipmentId: text('shipment_id').notNull().references(() => shipments.id),
  /** Whom it was made for. */
  forWhom: text('for_whom').notNull(),
  createdBy: text('created_by').notNull(),
  createdAt: integer('created_at').notNull(),
  expiresAt: integer('expires_at').notNull(),
  revokedBy: text('revoked_by'),
  revokedAt: integer('revoked_at'),
  firstUsedAt: integer('first_used_at'),
}, table => [index('dock_links_shipment').on(table.shipmentId)])

/** The reclaimer's figures of a line as they stand for the settlement; every change of them is an act of the shipment. */
export const settlementLines = sqliteTable('settlement_lines', {
  shipmentId: text('shipment_id').notNull().references(() => shipments.id),
  cylinderId: text('cylinder_id').notNull(),
  theirGross: text('their_gross', { mode: 'json' }).$type<MassReading>(),
  acceptedNet: text('accepted_net', { mode: 'json' }).$type<MassReading>(),
  grade: text('grade'),
  /** Thousandths of the currency for each unit of mass; negative is charged. */
  mills: integer('mills'),
  per: text('per', { enum: ['lb', 'kg'] }),
  /** Hundredths of the currency; what the statement credits for this line, null where it does not say. */
  statedCents: integer('stated_cents'),
  /** What became of the cylinder. */
  outcome: text('outcome', { enum: ['taken-over', 'sent-back', 'not-arrived'] }),
}, table => [primaryKey({ columns: [table.shipmentId, table.cylinderId] })])

/** What a statement says of a whole shipment. */
export const settlements = sqliteTable('settlements', {
  shipmentId: text('shipment_id').primaryKey().references(() => shipments.id),
  statementNumber: text('statement_number'),
  statementDay: text('statement_day'),
  /** Fees and other amounts beside the lines: [{ what, cents }], negative is charged. */
  others: text('others', { mode: 'json' }).$type<{ what: string, cents: number }[]>().notNull(),
  statedTotalCents: integer('stated_total_cents'),
})

/** A difference that is argued with the reclaimer; its messages are acts of the shipment. */
export const disputes = sqliteTable('disputes', {
  id: text('id').primaryKey(),
  shipmentId: text('shipment_id').notNull().references(() => shipments.id),
  /** null where it is about the whole statement. */
  cylinderId: text('cylinder_id'),
  about: text('about', { enum: ['gross', 'net', 'grade', 'credit', 'missing', 'unexpected', 'total'] }).notNull(),
  /** null where the figures opened it by themselves. */
  openedBy: text('opened_by'),
  openedAt: integer('opened_at').notNull(),
  outcome: text('outcome', { enum: ['theirs-accepted', 'ours-accepted', 'agreed', 'no-difference'] }),
  reason: text('reason'),
  endedBy: text('ended_by'),
  endedAt: integer('ended_at'),
}, table => [index('disputes_shipment').on(table.shipmentId)])

/** Statements and certificates that were uploaded to a shipment; the files lie under the hash, apart from the photos. */
export const shipmentFiles = sqliteTable('shipment_files', {
  id: text('id').primaryKey(),
  shipmentId: text('shipment_id').notNull().references(() => shipments.id),
  kind: text('kind', { enum: ['statement', 'certificate', 'other'] }).notNull(),
  name: text('name').notNull(),
  mediaType: text('media_type').notNull(),
  bytes: integer('bytes').notNull(),
  contentHash: text('content_hash').notNull(),
  /** The lines it belongs to; empty for the whole shipment. */
  cylinderIds: text('cylinder_ids', { mode: 'json' }).$type<string[]>().notNull(),
  uploadedBy: text('uploaded_by').notNull(),
  uploadedAt: integer('uploaded_at').notNull(),
}, table => [index('shipment_files_shipment').on(table.shipmentId)])

/** A visit to a customer's equipment: what was recovered there is told in one note. */
export const jobs = sqliteTable('jobs', {
  id: text('id').primaryKey(),
  number: integer('number').notNull().unique(),
  /** The customer among the firms; null where only a name is known. */
  customerId: text('customer_id').references(() => firms.id),
  customerName: text('customer_name').notNull(),
  email: text('email'),
  /** Where the equipment stands. */
  site: text('site').notNull(),
  equipment: text('equipment').notNull(),
  refrigerant: text('refrigerant'),
  charge: text('charge', { mode: 'json' }).$type<MassReading>(),
  /** Whose the recovered refrigerant stays: the customer's, or ours. */
  keeps: text('keeps', { enum: ['customer', 'firm'] }).notNull(),
  /** What is opened, why, and since when its recovery machine is made, as far as they were said: the required vacuum goes by them. */
  opened: text('opened', { mode: 'json' }).$type<{ appliance?: Appliance, circumstances?: Circumstances, machineMade?: MachineMade }>(),
  note: text('note'),
  createdBy: text('created_by').notNull(),
  createdAt: integer('created_at').notNull(),
  /** How often what it says was changed since. */
  changes: integer('changes').notNull().default(0),
}, table => [index('jobs_customer').on(table.customerId)])

/** Recovery notes that went to a customer: which issue, to whom, by which letter. The id is the sender's, so that one asked for twice goes once. */
export const jobNotes = sqliteTable('job_notes', {
  id: text('id').primaryKey(),
  jobId: text('job_id').notNull().references(() => jobs.id),
  issue: integer('issue').notNull(),
  recipient: text('recipient').notNull(),
  /** null until its letter was written. */
  mailId: text('mail_id').references(() => mail.id),
  sentBy: text('sent_by').notNull(),
  sentAt: integer('sent_at').notNull(),
}, table => [index('job_notes_job').on(table.jobId)])

/** A plan that was made: the question, the answer, and whether it is still followed. */
export const plans = sqliteTable('plans', {
  id: text('id').primaryKey(),
  number: integer('number').notNull().unique(),
  kind: text('kind', { enum: ['consolidation', 'shipping'] }).notNull(),
  question: text('question', { mode: 'json' }).notNull(),
  answer: text('answer', { mode: 'json' }).notNull(),
  state: text('state', { enum: ['open', 'done', 'dropped'] }).notNull(),
  madeBy: text('made_by').notNull(),
  madeAt: integer('made_at').notNull(),
  endedAt: integer('ended_at'),
})

/** One step of a plan, ticked off by what the log says afterwards. */
export const planTasks = sqliteTable('plan_tasks', {
  planId: text('plan_id').notNull().references(() => plans.id),
  position: integer('position').notNull(),
  kind: text('kind', { enum: ['transfer', 'ship'] }).notNull(),
  fromCylinderId: text('from_cylinder_id').notNull(),
  /** null where it is shipped. */
  toCylinderId: text('to_cylinder_id'),
  /** As planned; null where all of it goes, whatever it weighs. */
  netGrams: integer('net_grams'),
  /** The event that did it; null while it is to be done. */
  doneEventId: text('done_event_id'),
  doneAt: integer('done_at'),
}, table => [primaryKey({ columns: [table.planId, table.position] }), index('plan_tasks_from').on(table.fromCylinderId)])

export const testLots = sqliteTable('test_lots', {
  id: text('id').primaryKey(),
  number: integer('number').notNull().unique(),
  requalifierId: text('requalifier_id').notNull().references(() => firms.id),
  state: text('state', { enum: ['draft', 'sent', 'back', 'cancelled'] }).notNull(),
  note: text('note'),
  createdAt: integer('created_at').notNull(),
  createdBy: text('created_by').notNull(),
  sentAt: integer('sent_at'),
  sentBy: text('sent_by'),
  backAt: integer('back_at'),
})

export const testLotLines = sqliteTable('test_lot_lines', {
  lotId: text('lot_id').notNull().references(() => testLots.id),
  cylinderId: text('cylinder_id').notNull(),
  position: integer('position').notNull(),
}, table => [primaryKey({ columns: [table.lotId, table.cylinderId] })])

/** A cylinder stands on at most one open shipment or lot: this key holds it. */
export const openLines = sqliteTable('open_lines', {
  cylinderId: text('cylinder_id').primaryKey(),
  listKind: text('list_kind', { enum: ['shipment', 'test-lot'] }).notNull(),
  listId: text('list_id').notNull(),
}, table => [index('open_lines_list').on(table.listId)])

/** How a person has a table: which columns in which order, and how tall its rows. One row a person and table. */
export const tableLayouts = sqliteTable('table_layouts', {
  personId: text('person_id').notNull().references(() => people.id),
  tableName: text('table_name', { enum: ['fleet'] }).notNull(),
  columns: text('columns', { mode: 'json' }).$type<string[]>().notNull(),
  density: text('density', { enum: ['compact', 'comfortable'] }).notNull(),
}, table => [primaryKey({ columns: [table.personId, table.tableName] })])

/** Views of the fleet that a person gave a name: filters and order as they stand in its address. */
export const fleetViews = sqliteTable('fleet_views', {
  id: text('id').primaryKey(),
  personId: text('person_id').notNull().references(() => people.id),
  name: text('name').notNull(),
  query: text('query', { mode: 'json' }).$type<Record<string, string>>().notNull(),
  createdAt: integer('created_at').notNull(),
}, table => [uniqueIndex('fleet_views_person_name').on(table.personId, table.name)])

/** What this database is: whether the demo firm lives in it, and which migration of the caches it has. */
export const meta = sqliteTable('meta', {
  key: text('key').primaryKey(),
  value: text('value').notNull().default(sql`''`),
})
