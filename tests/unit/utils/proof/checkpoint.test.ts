import { describe, expect, it } from 'vitest'
import { checkpointText, leafText, originOf, readCheckpoint, type Checkpoint } from '../../../../utils/proof/checkpoint'
import { readNote, writeNote } from '../../../../utils/proof/note'

const CHECKPOINT: Checkpoint = {
  origin: 'custody-log/0198f000-0000-7000-8000-0000000000f1',
  number: 12,
  at: Date.UTC(2026, 6, 1, 17, 0, 0, 5),
  seq: 4_812,
  events: 4_812,
  cylinders: 360,
  root: 'CsUYapGGPo4dkMgIAUqom/Xajj7h2fB2MPA3j2jxq2I=',
  previous: 'fac54203e7cc696cf0dfcb42c92a1d9dbaf70ad9e621f4bd8d98662f00e3c125',
}
const TEXT = `custody-log/0198f000-0000-7000-8000-0000000000f1
360
CsUYapGGPo4dkMgIAUqom/Xajj7h2fB2MPA3j2jxq2I=
number 12
events 4812
seq 4812
at 2026-07-01T17:00:00.005Z
previous fac54203e7cc696cf0dfcb42c92a1d9dbaf70ad9e621f4bd8d98662f00e3c125
`

describe('a checkpoint', () => {
  it('is a text whose first lines are the log, the number of cylinders and the root', () => {
    expect(checkpointText(CHECKPOINT)).toBe(TEXT)
  })

  it('is read back from its text', () => {
    expect(readCheckpoint(TEXT)).toEqual(CHECKPOINT)
  })

  it('names none before the first', () => {
    const text = checkpointText({ ...CHECKPOINT, previous: '' })
    expect(text).toContain('\nprevious none\n')
    expect(readCheckpoint(text)?.previous).toBe('')
  })

  it.each([
    ['a line too many', `${TEXT}more\n`],
    ['a line too few', TEXT.replace(/number 12\n/, '')],
    ['a figure with a leading zero', TEXT.replace('events 4812', 'events 04812')],
    ['a root that is too short', TEXT.replace('CsUYapGG', 'CsUY')],
    ['a time that is none', TEXT.replace('2026-07-01', '2026-13-01')],
    ['an end without a line break', TEXT.slice(0, -1)],
  ])('is not read from a text with %s', (_, text) => {
    expect(readCheckpoint(text)).toBeNull()
  })

  it('has a leaf a cylinder, of its id, its last version and the hash of that line', () => {
    expect(leafText({ cylinderId: 'c1', version: 3, hash: 'ab' })).toBe('["c1",3,"ab"]')
  })

  it('is signed under the name of the firm\'s log', () => {
    expect(originOf('0198')).toBe('custody-log/0198')
  })
})

describe('a signed note', () => {
  // The example of golang.org/x/mod/sumdb/note, on which C2SP signed-note rests.
  const NOTE = 'If you think cryptography is the answer to your problem,\nthen you don\'t know what your problem is.\n\n'
    + '\u2014 PeterNeumann x08go/ZJkuBS9UG/SffcvIAQxVBtiFupLLr8pAcElZInNIuGUgYN1FFYC2pZSNXgKvqfqdngotpRZb6KE6RyyBwJnAM=\n'

  it('is parted into its text and its signatures, and put together again', () => {
    const note = readNote(NOTE)
    expect(note?.text).toBe('If you think cryptography is the answer to your problem,\nthen you don\'t know what your problem is.\n')
    expect(note?.signatures).toEqual([{
      name: 'PeterNeumann', base64: 'x08go/ZJkuBS9UG/SffcvIAQxVBtiFupLLr8pAcElZInNIuGUgYN1FFYC2pZSNXgKvqfqdngotpRZb6KE6RyyBwJnAM=',
    }])
    expect(writeNote(note!)).toBe(NOTE)
  })

  it('is parted at its last empty line', () => {
    expect(readNote('one\n\ntwo\n\n\u2014 name AAAA\n')?.text).toBe('one\n\ntwo\n')
  })

  it.each([
    ['no empty line', 'text\n\u2014 name AAAA\n'],
    ['no signature', 'text\n\n'],
    ['a hyphen in place of the dash', 'text\n\n- name AAAA\n'],
    ['a key\'s name with a plus', 'text\n\n\u2014 na+me AAAA\n'],
    ['no line break at its end', 'text\n\n\u2014 name AAAA'],
  ])('is none with %s', (_, text) => {
    expect(readNote(text)).toBeNull()
  })
})
