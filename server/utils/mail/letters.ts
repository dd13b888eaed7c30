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
