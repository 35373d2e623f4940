import type { z } from 'zod'

type Issue = z.core.$ZodIssue

const NOUNS: Record<string, string> = {
  number: 'a finite number',
  int: 'a whole number',
  string: 'a text',
  boolean: 'true or false',
  array: 'a list',
  object: 'an object',
  record: 'an object',
}

const list = (values: readonly unknown[]): string => values.map((value) => JSON.stringify(value)).join(', ')

const size = (origin: string, amount: string): string =>
  origin === 'string' ? `${amount} character(s)` : origin === 'array' ? `${amount} in the list` : amount

/** What is wrong and what is allowed, one sentence; a schema's own words are kept. `missing`: nothing stands there. */
export function faultWords(issue: Issue, missing: boolean): string {
  switch (issue.code) {
    case 'too_small':
      return `allowed: ${issue.inclusive ? 'at least' : 'above'} ${size(issue.origin, String(issue.minimum))}`
    case 'too_big':
      return `allowed: ${issue.inclusive ? 'at most' : 'below'} ${size(issue.origin, String(issue.maximum))}`
    case 'invalid_type':
      return missing ? `missing; allowed: ${noun(issue.expected)}` : `allowed: ${noun(issue.expected)}`
    case 'invalid_value':
      return `allowed: ${list(issue.values)}`
    case 'invalid_union':
      return 'options' in issue && Array.isArray(issue.options)
        ? `${missing ? 'missing; ' : ''}allowed: ${list(issue.options)}`
        : issue.message
    default:
      return issue.message
  }
}

const noun = (expected: string): string => NOUNS[expected] ?? expected
