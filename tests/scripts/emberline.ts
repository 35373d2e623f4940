import { spawn } from 'node:child_process'
import { once } from 'node:events'
import { readFileSync, readdirSync, readlinkSync } from 'node:fs'
import { join } from 'node:path'

/** `npm start` in some folder, as a person at a terminal sees it. */
export interface RunningStart {
  /** Everything printed so far. */
  output(): string
  /** Resolves to the first match of `pattern` in the output, or rejects when the command ends without. */
  waitFor(pattern: RegExp): Promise<RegExpExecArray>
  /** Sends the signal to npm and resolves to its exit status. */
  end(signal: NodeJS.Signals): Promise<number | null>
  status: Promise<number | null>
}

/** What a terminal's environment has, without what vitest and npm have put into ours. */
function terminalEnvironment(): NodeJS.ProcessEnv {
  const foreign = /^(npm_|EMBERLINE_|VITEST|TEST$|NODE_ENV$|NODE_OPTIONS$|INIT_CWD$)/i
  return Object.fromEntries(Object.entries(process.env).filter(([name]) => !foreign.test(name)))
}

export function startEmberline(folder: string, port: number): RunningStart {
  const child = spawn('npm', ['start'], {
    cwd: folder,
    // Packages come from npm's cache where it has them: the registry is not what is tested.
    env: { ...terminalEnvironment(), npm_config_prefer_offline: 'true', EMBERLINE_PORT: String(port) },
    stdio: ['ignore', 'pipe', 'pipe'],
  })
  let text = ''
  const listeners = new Set<() => void>()
  const hear = (chunk: Buffer): void => {
    text += chunk.toString('utf8')
    for (const listener of listeners) listener()
  }
  child.stdout.on('data', hear)
  child.stderr.on('data', hear)
  const status = once(child, 'close').then(([code]: (number | null)[]) => code ?? null)
  return {
    output: () => text,
    status,
    waitFor(pattern) {
      const found = new Promise<RegExpExecArray>((resolve) => {
        const look = (): void => {
          const match = pattern.exec(text)
          if (match === null) return
          listeners.delete(look)
          resolve(match)
        }
        listeners.add(look)
        look()
      })
      const ended = status.then((code) => {
        throw new Error(`npm start ended with status ${code} without saying ${pattern.source}:\n${text}`)
      })
      return Promise.race([found, ended])
    },
    end(signal) {
      child.kill(signal)
      return status
    },
  }
}

function linkOrNothing(path: string): string {
  try {
    return readlinkSync(path)
  } catch {
    return ''
  }
}

function textOrNothing(path: string): string {
  try {
    return readFileSync(path, 'utf8')
  } catch {
    return ''
  }
}

/** The command lines of processes at work in `folder` or naming it, such as a database left running. */
export function processesIn(folder: string): string[] {
  return readdirSync('/proc')
    .filter((name) => /^\d+$/.test(name))
    .map((pid) => ({
      at: linkOrNothing(join('/proc', pid, 'cwd')),
      command: textOrNothing(join('/proc', pid, 'cmdline')).replaceAll('\0', ' '),
    }))
    .filter(({ at, command }) => at.startsWith(folder) || command.includes(folder))
    .map(({ command }) => command)
}
