import { dictionary } from '@zxcvbn-ts/language-common'
import { InputError } from '#core/wire/index'

/** NIST SP 800-63B, 3.1.1.2: a minimum length, long ones welcome, a list of common ones, no rules of composition. */
const SHORTEST = 8
const LONGEST = 256

let common: ReadonlySet<string> | undefined

/** Some fifty thousand passwords from breaches, in lower case; read when first needed. */
function commonPasswords(): ReadonlySet<string> {
  common ??= new Set(dictionary['passwords-common'] as string[])
  return common
}

const bare = (text: string): string => text.normalize('NFKC').toLowerCase().replaceAll(/\s+/g, '')

/** One character or a short piece over and over. */
const isRepetition = (password: string): boolean => /^(.{1,3}?)\1+$/su.test(password)

/** What people who know the person would try first: names and addresses, alone or with figures around them. */
function isPersonal(password: string, personal: readonly string[]): boolean {
  const core = bare(password).replaceAll(/^[\d\p{P}]+|[\d\p{P}]+$/gu, '')
  return personal.some((word) => {
    const plain = bare(word)
    return plain.length >= 3 && (core === plain || bare(password) === plain)
  })
}

function faultOf(password: string, personal: readonly string[]): string | null {
  const length = [...password.normalize('NFKC')].length
  if (length < SHORTEST) return `allowed: ${SHORTEST} characters or more; a few words make a good one`
  if (length > LONGEST) return `allowed: at most ${LONGEST} characters`
  if (commonPasswords().has(bare(password)) || isRepetition(password))
    return 'one of the passwords that are tried first; choose another, such as a few words'
  if (isPersonal(password, personal))
    return 'a name that belongs to you or your group; choose another, such as a few words'
  return null
}

/** Throws an InputError at `path` unless the password may be chosen; `personal` are the names not to build it from. */
export function requireGoodPassword(password: string, path: string, personal: readonly string[]): void {
  const words = personal.flatMap((word) => [word, ...word.split(/[@\s.]+/)])
  const message = faultOf(password, [...words, 'emberline'])
  if (message !== null) throw new InputError([{ path, message }])
}
