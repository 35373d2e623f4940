import { hash, verify } from '@node-rs/argon2'

/** The argon2id hash of a password, in the PHC text form that carries its salt and costs. */
export const hashPassword = (password: string): Promise<string> => hash(password)

export const passwordMatches = (storedHash: string, password: string): Promise<boolean> =>
  verify(storedHash, password)
