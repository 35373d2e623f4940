import { readFileSync } from 'node:fs'
import { gzipSync } from 'node:zlib'
import { describe, expect, it } from 'vitest'

interface Chunk {
  file: string
  imports?: string[]
}

const manifest = JSON.parse(readFileSync('dist/web/.vite/manifest.json', 'utf8')) as Record<string, Chunk>

/** A chunk and everything it needs before it can run. */
function withImports(key: string, found = new Set<string>()): Set<string> {
  if (found.has(key)) return found
  found.add(key)
  for (const each of manifest[key]!.imports ?? []) withImports(each, found)
  return found
}

const compressed = (key: string): number => gzipSync(readFileSync(`dist/web/${manifest[key]!.file}`)).length

describe('what a browser loads before the Bench is usable', () => {
  const needed = withImports('index.html')
  for (const key of withImports('src/features/bench/BenchPage.tsx')) needed.add(key)

  it('is under 260 kB of JavaScript on the main thread, compressed', () => {
    const kilobytes = [...needed].reduce((sum, key) => sum + compressed(key), 0) / 1000
    // Counted with the tool at hand: 160 kB when this was written.
    expect(kilobytes).toBeLessThan(260)
    expect(kilobytes).toBeGreaterThan(50)
  })

  it('holds neither the solver nor the schemas: they live in the worker', () => {
    const text = [...needed].map((key) => readFileSync(`dist/web/${manifest[key]!.file}`, 'utf8')).join('\n')
    expect(text).not.toContain('solutions of rising accuracy do not agree')
    expect(text).not.toContain('invalid_union')
  })
})
