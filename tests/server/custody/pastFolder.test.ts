import { spawnSync } from 'node:child_process'
import { existsSync, mkdirSync, mkdtempSync, rmSync } from 'node:fs'
import { hostname, tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterAll, beforeAll, expect, it } from 'vitest'
import { pastFolder } from '../../../server/utils/custody/pastFolder'

const TEMPORARY = process.env.TMPDIR
beforeAll(() => {
  process.env.TMPDIR = mkdtempSync(join(tmpdir(), 'temporary-'))
})
afterAll(() => {
  rmSync(process.env.TMPDIR!, { recursive: true })
  if (TEMPORARY === undefined) delete process.env.TMPDIR
  else process.env.TMPDIR = TEMPORARY
})

it('takes away what a killed process left, and nothing of one that lives, here or on another machine', () => {
  const gone = spawnSync(process.execPath, ['-e', '']).pid
  const folder = (host: string, pid: number) => join(tmpdir(), `collarbook-past-${host}-${pid}-abc123`)
  const [left, inUse, elsewhere] = [folder(hostname(), gone), folder(hostname(), process.ppid), folder('elsewhere', gone)]
  for (const one of [left, inUse, elsewhere]) mkdirSync(one)
  const own = pastFolder()
  expect([left, inUse, elsewhere, own].map(one => existsSync(one))).toEqual([false, true, true, true])
})
