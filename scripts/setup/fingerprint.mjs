import { createHash } from 'node:crypto'
import { existsSync, readFileSync, readdirSync, statSync } from 'node:fs'
import { join, relative } from 'node:path'
import { ROOT } from './project.mjs'

function filesUnder(path) {
  if (!existsSync(path)) return []
  if (statSync(path).isFile()) return [path]
  return readdirSync(path, { withFileTypes: true, recursive: true })
    .filter((entry) => entry.isFile())
    .map((entry) => join(entry.parentPath ?? entry.path, entry.name))
    .sort()
}

/** A digest of the names and contents of files and folders, given from `root`, and of Node's version. */
export function fingerprint(paths, root = ROOT) {
  const hash = createHash('sha256').update(process.versions.node)
  for (const file of paths.flatMap((path) => filesUnder(join(root, path)))) {
    hash.update(`\0${relative(root, file)}\0`).update(readFileSync(file))
  }
  return hash.digest('hex')
}
