export const evidence = (a: boolean, b: unknown): number => (a && b ? 0 : 1)
