import type { Role } from '#core/wire/index'
import { hashPassword } from '#db/passwordHash'
import type pg from 'pg'
import { insertId } from './owner.ts'

export const PASSWORD = 'a password of the tests'

export interface Member {
  id: string
  name: string
  email: string
  role: Role
}

export interface TestGroup {
  id: string
  name: string
  lead: Member
  author: Member
  reader: Member
}

let hashed: Promise<string> | undefined

/** A group with one member of each role, all with the password PASSWORD. */
export async function makeGroup(owner: pg.Client, name: string): Promise<TestGroup> {
  hashed ??= hashPassword(PASSWORD)
  const passwordHash = await hashed
  const id = await insertId(owner, 'insert into groups (name) values ($1) returning id', [name])
  const member = async (role: Role): Promise<Member> => {
    const person = { name: `${name} ${role}`, email: `${role}@${name.toLowerCase()}.example` }
    const userId = await insertId(
      owner,
      'insert into users (name, email, password_hash) values ($1, $2, $3) returning id',
      [person.name, person.email, passwordHash],
    )
    await owner.query('insert into memberships (group_id, user_id, role) values ($1, $2, $3)', [
      id,
      userId,
      role,
    ])
    return { ...person, id: userId, role }
  }
  return {
    id,
    name,
    lead: await member('lead'),
    author: await member('author'),
    reader: await member('reader'),
  }
}
