import { execFileSync } from 'node:child_process'
import { describe, expect, it } from 'vitest'
import { curlSnippet, pythonSnippet } from '../../../../web/src/features/reference/snippets.ts'
import type { Call } from '../../../../web/src/features/reference/apiDocument.ts'

const awkward = {
  text: 'it’s "quoted" and \'bare\' \\ $HOME `ls`',
  none: null,
  yes: true,
  list: [1, 2.5e-26],
}

const call: Call = {
  method: 'post',
  path: '/things/{id}',
  operation: {
    operationId: 'makeThing',
    summary: '',
    tags: ['things'],
    security: [{ key: [] }],
    requestBody: { content: { 'application/json': { example: awkward } } },
    responses: {},
  },
}

describe('the example of a call', () => {
  it('survives the shell, whatever stands in its body', () => {
    const printed = curlSnippet(call, 'http://here', '7').replace(/^curl/, 'printf "%s\\n"')
    const lines = execFileSync('/bin/sh', ['-c', printed], { encoding: 'utf8' }).trimEnd().split('\n')
    expect(JSON.parse(lines.at(-1)!)).toEqual(awkward)
    expect(lines).toContain('http://here/api/v1/things/7')
  })

  it('writes JSON as Python does', () => {
    const text = pythonSnippet(call, 'http://here', '7')
    expect(text).toContain('"none": None, "yes": True, "list": [1, 2.5e-26]')
    expect(text).toContain('method="POST"')
  })
})
