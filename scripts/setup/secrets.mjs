import { randomBytes } from 'node:crypto'
import { existsSync, readFileSync, renameSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'

const secret = () => randomBytes(32).toString('base64url')

const NAMES = ['superuser', 'owner', 'server', 'session']

export const secretsFileOf = (dataFolder) => join(dataFolder, 'secrets.json')

/**
 * The passwords of the three database roles and the key that signs sessions: made at the first start and kept,
 * readable for their owner alone.
 */
export function openSecrets(dataFolder) {
  const file = secretsFileOf(dataFolder)
  if (existsSync(file)) return JSON.parse(readFileSync(file, 'utf8'))
  const secrets = Object.fromEntries(NAMES.map((name) => [name, secret()]))
  const unfinished = `${file}.${process.pid}`
  writeFileSync(unfinished, `${JSON.stringify(secrets, null, 2)}\n`, { mode: 0o600 })
  renameSync(unfinished, file)
  return secrets
}
