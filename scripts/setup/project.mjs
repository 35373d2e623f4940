import { join } from 'node:path'
import { fileURLToPath } from 'node:url'

/** The project's root folder, whatever folder the command was given in. */
export const ROOT = fileURLToPath(new URL('../..', import.meta.url)).replace(/\/$/, '')

/** Where everything that is made at run time lives; git ignores it. */
export const DATA_FOLDER = join(ROOT, '.data')

export const inProject = (...parts) => join(ROOT, ...parts)
