/** The day of the machine's calendar, as the record takes it: 2026-03-31. */
export const today = (now: Date): string => {
  const two = (part: number) => String(part).padStart(2, '0')
  return `${String(now.getFullYear()).padStart(4, '0')}-${two(now.getMonth() + 1)}-${two(now.getDate())}`
}
