import { exampleBody } from './apiDocument.ts'
import type { Call } from './apiDocument.ts'

/** Where the secret of a key is read from in every example: never written into a script. */
export const KEY_VARIABLE = 'EMBERLINE_KEY'

const addressOf = (origin: string, path: string, id: string): string =>
  `${origin}/api/v1${path.replace('{id}', id)}`

/** Inside single quotes the shell changes nothing but the quote itself. */
const quoted = (text: string): string => `'${text.replaceAll("'", `'\\''`)}'`

/** The call as a line for a shell. */
export function curlSnippet(call: Call, origin: string, id = 'ID'): string {
  const body = exampleBody(call)
  return [
    `curl --fail-with-body -X ${call.method.toUpperCase()} ${quoted(addressOf(origin, call.path, id))}`,
    `  -H "Authorization: Bearer $${KEY_VARIABLE}"`,
    ...(body === undefined
      ? []
      : [`  -H 'Content-Type: application/json'`, `  --data ${quoted(JSON.stringify(body))}`]),
  ].join(' \\\n')
}

/** A Python literal of a JSON value. */
function pythonLiteral(value: unknown): string {
  if (value === null) return 'None'
  if (typeof value === 'boolean') return value ? 'True' : 'False'
  if (Array.isArray(value)) return `[${value.map(pythonLiteral).join(', ')}]`
  if (typeof value === 'object')
    return `{${Object.entries(value)
      .map(([key, inner]) => `${JSON.stringify(key)}: ${pythonLiteral(inner)}`)
      .join(', ')}}`
  return JSON.stringify(value)
}

/** The call in Python, with nothing but its standard library. */
export function pythonSnippet(call: Call, origin: string, id = 'ID'): string {
  const body = exampleBody(call)
  const hasBody = body !== undefined
  return [
    'import json, os, urllib.request',
    '',
    ...(hasBody ? [`body = ${pythonLiteral(body)}`] : []),
    'request = urllib.request.Request(',
    `    ${JSON.stringify(addressOf(origin, call.path, id))},`,
    `    method=${JSON.stringify(call.method.toUpperCase())},`,
    ...(hasBody ? ['    data=json.dumps(body).encode(),'] : []),
    '    headers={',
    `        "Authorization": "Bearer " + os.environ["${KEY_VARIABLE}"],`,
    ...(hasBody ? ['        "Content-Type": "application/json",'] : []),
    '    },',
    ')',
    'with urllib.request.urlopen(request) as answer:',
    '    print(json.dumps(json.load(answer), indent=2))',
  ].join('\n')
}
