/** Expressions as plain text, for messages and for telling whether two are the same. */
import type { Expression } from './expression.ts'
import { plain } from './script.ts'
import { setSymbols } from './typeset.ts'

export const plainExpression = (tree: Expression): string => setSymbols(tree, plain)
