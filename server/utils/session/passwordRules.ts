import { problem } from '../http/problem'
import { isCommonPassword } from './commonPasswords'

/**
 * Refuses a new password that others would try first. Nothing is asked of its make-up.
 *
 * Errors: 422 naming the field.
 */
export function refuseWeakPassword(password: string, email: string, path: string): void {
  const because = weakness(password, email)
  if (because) throw problem(422, 'Choose another password', `The password ${because}.`, [{ path, message: because }], { type: 'weak-password' })
}

/** Why a password would be guessed soon, or null. */
export function weakness(password: string, email: string): string | null {
  const plain = password.normalize('NFKC').toLowerCase().trim()
  const [mailbox = ''] = email.toLowerCase().split('@')
  if (plain === email.toLowerCase() || plain.replace(/[^a-z]/g, '') === email.toLowerCase().replace(/[^a-z]/g, '')) return 'is your own address'
  if (mailbox.length >= 4 && isPaddedWith(plain, mailbox)) return 'is little more than your own name'
  return isCommonPassword(plain) ? 'is one that many people use' : null
}

function isPaddedWith(plain: string, word: string): boolean {
  return plain.split(word).join('').replace(/[^a-z]/g, '') === '' && plain.includes(word)
}
