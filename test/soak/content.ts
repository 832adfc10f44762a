/** What the revision with this sequence says: of all lengths from a line to many pages of the database. */
export const contentOf = (
  sequence: number,
): { readonly note: string; readonly text: string; readonly author: string } => {
  const length = (sequence * 7919) % 30_000
  return {
    note: `note ${sequence} `.repeat(Math.ceil(length / 10)).slice(0, length),
    text: JSON.stringify({ sequence, filler: 'x'.repeat((sequence * 104_729) % 20_000) }),
    author: `Автор № ${sequence}`,
  }
}
