/** Arguments and answers against their schemas: every fault named by its field. */
import * as v from 'valibot'
import { join } from '../job/json.ts'
import { echo } from '../quantity/signs.ts'
import { CALLS, type Answer, type Argument, type CallName } from './calls.ts'
import { done, refuse, type CallError, type Outcome } from './errors.ts'

/** A field that is too long need not also be told that it is of the wrong form. */
const ONE_FAULT_A_FIELD = { abortPipeEarly: true } as const

/** The argument of a call, or an error of kind `argument` that names every wrong field. */
export const readArgument = <N extends CallName>(name: N, argument: unknown): Outcome<Argument<N>> => {
  const read = v.safeParse(CALLS[name].argument, Array.isArray(argument) ? undefined : argument, ONE_FAULT_A_FIELD)
  if (read.success) return done(read.output as Argument<N>)
  const at = faultsOf(read.issues)
  return refuse(
    'argument',
    `${name}: ${at.map(({ path, message }) => `${path || 'argument'}: ${message}`).join('; ')}`,
    at,
  )
}

/** The answer to a call, or an error of kind `fault`: only a fault of the program makes a wrong answer. */
export const readAnswer = <N extends CallName>(name: N, answer: unknown): Outcome<Answer<N>> => {
  const read = v.safeParse(CALLS[name].result, answer, ONE_FAULT_A_FIELD)
  if (read.success) return done(read.output as Answer<N>)
  const at = faultsOf(read.issues)
  return refuse(
    'fault',
    `${name}: the answer is not what was agreed: ${at.map(({ path, message }) => `${path}: ${message}`).join('; ')}`,
    at,
  )
}

type Faults = NonNullable<CallError['at']>

const faultsOf = (issues: readonly v.BaseIssue<unknown>[]): Faults =>
  issues.map((issue) => ({
    path: (issue.path ?? []).reduce<string>(
      (path, { key }) => join(path, typeof key === 'number' ? key : String(key)),
      '',
    ),
    read: sample(issue.input),
    message: messageOf(issue),
  }))

/** The schemas' checks speak for themselves; what the library says of types is put plainly. */
const messageOf = ({ kind, type, expected, received, message }: v.BaseIssue<unknown>): string => {
  if (kind === 'validation' || type === 'custom') return message
  if (expected === 'never') return 'there is no such field'
  if (received === 'undefined') return `is missing; right would be ${expected ?? 'a value'}`
  return `right would be ${expected ?? 'a value'}`
}

/** A short look at what was read; of a list or an object only its kind. */
const sample = (input: unknown): string => {
  if (typeof input === 'string') return echo(input.slice(0, 100))
  if (input === undefined) return 'nothing'
  if (typeof input === 'number' || typeof input === 'boolean' || input === null) return String(input)
  return Array.isArray(input) ? 'a list' : `a value of type ${typeof input}`
}
