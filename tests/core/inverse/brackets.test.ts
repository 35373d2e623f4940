import { z } from 'zod'
import { describe, expect, it } from 'vitest'
import { USUAL_BRACKETS, usualBracket } from '#core/inverse/brackets'
import { candidateInput, historyInput } from '#core/wire/index'

interface JsonSchema {
  type?: string
  minimum?: number
  maximum?: number
  exclusiveMinimum?: number
  multipleOf?: number
  $ref?: string
  $defs?: Record<string, JsonSchema>
  properties?: Record<string, JsonSchema>
  items?: JsonSchema
  prefixItems?: JsonSchema[]
  anyOf?: JsonSchema[]
  oneOf?: JsonSchema[]
}

interface Place {
  path: string
  low: number
  high: number
}

/** Every continuous number the wire takes, with the range it may have. */
function places(schema: JsonSchema, path: string, definitions: Record<string, JsonSchema>): Place[] {
  const into = (inner: JsonSchema, at: string): Place[] => places(inner, at, definitions)
  if (schema.$ref) return into(definitions[schema.$ref.replace('#/$defs/', '')]!, path)
  if (schema.type === 'number' && schema.multipleOf === undefined) {
    const low = schema.exclusiveMinimum ?? schema.minimum ?? -Infinity
    return [{ path, low, high: schema.maximum ?? Infinity }]
  }
  return [
    ...[...(schema.anyOf ?? []), ...(schema.oneOf ?? [])].flatMap((each) => into(each, path)),
    ...Object.entries(schema.properties ?? {}).flatMap(([name, each]) => into(each, `${path}.${name}`)),
    ...(schema.items && !Array.isArray(schema.items) ? into(schema.items, `${path}[0]`) : []),
    ...(schema.prefixItems ?? []).flatMap((each, i) => into(each, `${path}[${i}]`)),
  ]
}

const allOf = (schema: z.ZodType, path: string): Place[] => {
  const written = z.toJSONSchema(schema, { io: 'input' }) as JsonSchema
  return places(written, path, written.$defs ?? {})
}

const all = [...allOf(candidateInput, 'candidate'), ...allOf(historyInput, 'history')]

describe('the usual brackets', () => {
  it('lie within what every number of history and candidate may be', () => {
    // Not a schema with all its branches overlooked.
    expect(all.length).toBeGreaterThan(60)
    for (const { path, low, high } of all.filter((each) => !each.path.includes('.points['))) {
      const bracket = usualBracket(path, {})
      expect(
        USUAL_BRACKETS.some((usual) => usual.path.test(path)),
        `${path} has a bracket of its own`,
      ).toBe(true)
      expect(bracket[0], path).toBeGreaterThanOrEqual(low)
      expect(bracket[1], path).toBeLessThanOrEqual(high)
      expect(bracket[0], path).toBeLessThan(bracket[1])
    }
  })

  it('are about the number that stands in a table', () => {
    const inputs = { candidate: { annihilation: { points: [[1, 2e-26]] } } }
    const [low, high] = usualBracket('candidate.annihilation.points[0][1]', inputs)
    expect(Math.sqrt(low * high)).toBeCloseTo(2e-26, 35)
    expect(low).toBeLessThan(1e-31)
  })
})
