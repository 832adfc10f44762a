/** Expressions as plain text. */
import type { Expression } from './expression.ts'

export const plainExpression = (tree: Expression): string => JSON.stringify(tree)
