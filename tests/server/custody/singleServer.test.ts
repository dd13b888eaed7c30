import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { holdDatabaseFile } from '../../../server/utils/database/singleServer'

let folder: string
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'collarbook-lock-'))
})
afterEach(() => rmSync(folder, { recursive: true, force: true }))

describe('the one server of a database file', () => {
  it('keeps a second one away while it lives', async () => {
    const held = await holdDatabaseFile(join(folder, 'a.db'))
    await expect(holdDatabaseFile(join(folder, 'a.db'))).rejects.toThrow('Another process is serving')
    held.close()
  })

  it('lets the next one in as soon as it has ended, a restart included', async () => {
    const held = await holdDatabaseFile(join(folder, 'b.db'))
    setTimeout(() => held.close(), 300)
    const next = await holdDatabaseFile(join(folder, 'b.db'))
    expect(next.listening).toBe(true)
    next.close()
  })

  it('holds each file apart, however long its path', async () => {
    const long = join(folder, 'x'.repeat(120))
    const both = await Promise.all([holdDatabaseFile(join(folder, 'c.db')), holdDatabaseFile(join(long, 'c.db'))])
    await expect(holdDatabaseFile(join(long, 'c.db'))).rejects.toThrow('Another process is serving')
    for (const one of both) one.close()
  })
})
