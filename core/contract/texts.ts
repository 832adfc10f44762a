/** What texts may hold: every one is bounded, can be stored as UTF-8 without loss, and has no control characters. */
import * as v from 'valibot'

/** Most characters (UTF-16 units, as a text field counts them) of each kind of text. */
export const MOST = { name: 200, note: 100_000, job: 1_000_000, settingName: 64, settingValue: 100_000 } as const

const wellFormed = v.check<string, string>(
  (text) => text.isWellFormed(),
  'holds half of a surrogate pair, which is no character',
)
const noControls = v.check<string, string>(
  (text) => !/\p{Cc}/u.test(text),
  'holds a control character or a line break; right would be one line of text',
)
const noOddControls = v.check<string, string>(
  (text) => !/[^\P{Cc}\n\r\t]/u.test(text),
  'holds a control character; right would be text, line breaks and tabs',
)
const most = (characters: number) =>
  v.maxLength<string, number, string>(characters, `has at most ${characters} characters`)

/** One line that may be empty: author, checker, purpose. */
export const Line = v.pipe(v.string(), most(MOST.name), wellFormed, noControls)

/** One line that says something. */
export const Name = v.pipe(
  Line,
  v.check((text) => text.trim() !== '', 'is empty; right would be a name'),
)

/** Text of many lines, some ten thousand words. */
export const Note = v.pipe(v.string(), most(MOST.note), wellFormed, noOddControls)

/** A job file's text. What it says is judged by the job room, not here. */
export const JobText = v.pipe(v.string(), most(MOST.job), wellFormed)

/** A day of the calendar as ISO 8601 writes it: 2026-03-31. The caller's own date, for nothing here knows the time. */
export const Day = v.pipe(
  v.string(),
  v.maxLength(10, 'right would be a date as 2026-03-31'),
  v.check(isDay, 'right would be a date as 2026-03-31'),
)

/** A setting is called by letters, digits and dots: `window.units`. */
export const SettingName = v.pipe(
  v.string(),
  most(MOST.settingName),
  v.regex(
    /^[a-z][A-Za-z0-9]*(?:\.[a-z][A-Za-z0-9]*)*$/,
    'right would be letters and digits in parts with dots between, as window.units',
  ),
)

/** Gregorian calendar, years 0001 to 9999. */
function isDay(text: string): boolean {
  const parts = /^(\d{4})-(\d{2})-(\d{2})$/.exec(text)
  if (parts === null) return false
  const [year, month, day] = parts.slice(1).map(Number) as [number, number, number]
  const leap = year % 4 === 0 && (year % 100 !== 0 || year % 400 === 0)
  const days = [31, leap ? 29 : 28, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31][month - 1]
  return year > 0 && days !== undefined && day >= 1 && day <= days
}
