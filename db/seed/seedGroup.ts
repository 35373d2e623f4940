import type { GroupTransaction } from '../database.ts'
import { hashPassword } from '../passwordHash.ts'
import { groups } from '../schema/groups.ts'
import { memberships } from '../schema/memberships.ts'
import { users } from '../schema/users.ts'
import type { DemoGroup } from './demoData.ts'

/** Where and on whose behalf the rest of the seed writes. */
export interface SeedScope {
  tx: GroupTransaction
  groupId: string
  idOfPerson(email: string): string
}

/** Makes the group and its members. */
export async function seedGroup(tx: GroupTransaction, group: DemoGroup): Promise<Omit<SeedScope, 'tx'>> {
  const [row] = await tx.insert(groups).values({ name: group.name }).returning({ id: groups.id })
  if (row === undefined) throw new Error('an insert that raised nothing returned nothing')
  const people = await Promise.all(
    group.people.map(async ({ email, name, password, role }) => ({
      role,
      account: { email, name, passwordHash: await hashPassword(password), emailVerifiedAt: new Date() },
    })),
  )
  const accounts = await tx
    .insert(users)
    .values(people.map(({ account }) => account))
    .returning({ id: users.id, email: users.email })
  const idOfPerson = (email: string): string => {
    const account = accounts.find((one) => one.email === email)
    if (account === undefined) throw new Error(`data-demo names ${email}, who is not in group.json`)
    return account.id
  }
  await tx
    .insert(memberships)
    .values(people.map(({ account, role }) => ({ groupId: row.id, userId: idOfPerson(account.email), role })))
  return { groupId: row.id, idOfPerson }
}
