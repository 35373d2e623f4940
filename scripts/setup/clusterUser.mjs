import { spawnSync } from 'node:child_process'
import { existsSync, statSync } from 'node:fs'
import { Trouble } from './trouble.mjs'

const NAME = 'postgres'

function idOf(flag) {
  const { status, stdout } = spawnSync('id', [flag, NAME], { encoding: 'utf8' })
  if (status === 0) return Number(stdout)
  throw new Trouble(`PostgreSQL refuses to run as root, and this machine has no user ${NAME} to run it as.`)
}

/**
 * Whom PostgreSQL runs as: undefined for the user who started this; { uid, gid } of `postgres` when that is root,
 * as it refuses to run as root.
 */
export const unprivilegedUser = () =>
  process.getuid() === 0 ? { uid: idOf('-u'), gid: idOf('-g') } : undefined

/** As unprivilegedUser, but root runs a cluster made before as whoever made it. */
export function clusterUser(folder) {
  if (process.getuid() !== 0 || !existsSync(folder)) return unprivilegedUser()
  const { uid, gid } = statSync(folder)
  return uid === 0 ? unprivilegedUser() : { uid, gid }
}

/** Whether `user` gets through to `folder`, all its parents included. */
export function canReach(user, folder) {
  return spawnSync('test', ['-x', folder], { ...user, cwd: '/' }).status === 0
}
