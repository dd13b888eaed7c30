import { describe, expect, it } from 'vitest'
import { refuseWeakPassword, weakness } from '../../../server/utils/session/passwordRules'
import { Problem } from '../../../server/utils/http/problem'

const EMAIL = 'ann.miller@harbor.example'

describe('a new password', () => {
  it.each([
    'password1234', 'Password2026!', 'p@ssw0rd1234', 'letmeinletmein', 'iloveyou2024', 'welcome12345', 'adminadmin123',
    'qwertyuiop123', '1q2w3e4r5t6y', '123456789012', '0987654321098', 'abcdefghijklm', 'aaaaaaaaaaaa', 'abcabcabcabc', 'xyz1xyz1xyz1',
    'correct horse battery staple', 'summersummer1', 'refrigerant22', 'changeme2026!', 'monkey-dragon-1', 'PASSWORDPASSWORD',
  ])('is refused where many people use it: %s', (password) => {
    expect(weakness(password, EMAIL)).toBe('is one that many people use')
  })

  it.each(['ann.miller@harbor.example', 'Ann.Miller@Harbor.Example', 'annmillerharborexample', 'ann.miller@harbor.example1'])('is refused where it is one\'s own address: %s', (password) => {
    expect(weakness(password, EMAIL)).toBe('is your own address')
  })

  it('is refused where it is one\'s own name with figures', () => {
    expect(weakness('ann.miller-1984', EMAIL)).toBe('is little more than your own name')
  })

  it.each([
    'copper-elbow-1987', 'demo-cylinders-2026', 'the van smells of oil', 'kettle7 river stamp', '命令 とても長い合い言葉です', 'zvkqjwmxbnpd',
    'lower case only words', '491736205884', 'password of my grandmother',
  ])('needs nothing but to be one\'s own: %s', (password) => {
    expect(weakness(password, EMAIL)).toBeNull()
  })

  it('is refused as impossible, naming its field', () => {
    const refuse = () => refuseWeakPassword('password1234', EMAIL, 'admin.password')
    expect(refuse).toThrow(Problem)
    try {
      refuse()
    }
    catch (error) {
      expect((error as Problem).details).toMatchObject({ status: 422, errors: [{ path: 'admin.password' }] })
      expect(JSON.stringify((error as Problem).details)).not.toContain('password1234')
    }
  })
})
