import type { Letter } from './mail'

interface LinkLetter { recipient: string, name: string, firmName: string, link: string, days: number }

/** The letter that invites a person. */
export function invitationLetter({ recipient, name, firmName, link, days }: LinkLetter): Letter {
  return {
    recipient,
    subject: `${firmName}: your access to Collarbook`,
    body: [
      `Hello ${name},`, '',
      `${firmName} keeps its refrigerant cylinders with Collarbook and has made an account for you. Choose a password here:`, '',
      link, '',
      `The link works once, for ${days} days. If you did not expect this, leave it be.`, '',
    ].join('\n'),
  }
}

/** The letter with which a person who has an account chooses a new password. */
export function newPasswordLetter({ recipient, name, firmName, link, days }: LinkLetter): Letter {
  return {
    recipient,
    subject: `${firmName}: choose a new password for Collarbook`,
    body: [
      `Hello ${name},`, '',
      `An administrator of ${firmName} has sent you this link to choose a new password:`, '',
      link, '',
      `The link works once, for ${days} days. Your present password works until then.`, '',
    ].join('\n'),
  }
}

interface CheckpointLetter { recipient: string, name: string, firmName: string, note: string, number: number, events: number, publicKey: string }

/** The letter that brings an auditor a checkpoint, so that a copy of it is where nobody of the firm can change it. */
export function checkpointLetter({ recipient, name, firmName, note, number, events, publicKey }: CheckpointLetter): Letter {
  return {
    recipient,
    subject: `${firmName}: checkpoint ${number} of the custody log, ${events.toLocaleString('en-US')} events`,
    body: [
      `Hello ${name},`, '',
      'this is how the custody log stood when it was signed. Keep this letter: if the log is ever changed before this point, this text will no longer fit it.', '',
      note,
      `Signed with the key ${publicKey}`, '',
    ].join('\n'),
  }
}
