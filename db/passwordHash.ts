import { hash, verify } from '@node-rs/argon2'

/** The same password typed on another keyboard may come as other code points (NIST SP 800-63B, 3.1.1.2). */
const normalized = (password: string): string => password.normalize('NFKC')

/** The argon2id hash of a password, in the PHC text form that carries its salt and costs. */
export const hashPassword = (password: string): Promise<string> => hash(normalized(password))

export const passwordMatches = (storedHash: string, password: string): Promise<boolean> =>
  verify(storedHash, normalized(password))
