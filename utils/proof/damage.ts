/** What may be wrong with a log, its checkpoints, or what is made from it: each as the end of a sentence about a line, a checkpoint or a cylinder. */
export const DAMAGE_WORDS = {
  'changed': 'one of its columns was changed',
  'missing-before': 'a line before it is missing, or its version was changed',
  'unlinked': 'it does not follow the line before it',
  'missing-number': 'lines with these numbers are missing: the end of a cylinder’s log, or all of it',
  'unreadable': 'it cannot be read as what the log writes',
  'fewer-than-checkpointed': 'the log holds fewer lines than when it was signed: the end of a cylinder’s log, or all of it, is missing',
  'not-as-checkpointed': 'the log no longer ends, cylinder by cylinder, as it did when it was signed: something before it was written anew',
  'checkpoint-missing': 'it is missing, or the one before it was exchanged',
  'checkpoint-forged': 'its text is not what was signed',
  'checkpoint-other-key': 'it is signed by a key that this server does not know',
  'row-differs': 'its row in the fleet is not what its log gives',
  'movements-differ': 'its movements or its stock are not what its log gives',
  'labels-differ': 'its labels are not what its log gives',
} as const satisfies Record<string, string>

export type DamageKind = keyof typeof DAMAGE_WORDS
