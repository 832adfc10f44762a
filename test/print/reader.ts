/** What stands on the pages of a PDF: words, outlines and rules with the boxes they take, read from its own content. */
import { entry, listOf, nameOf, parse, readPdf, refOf, skip, stringOf, type Pdf, type Value } from './objects.ts'

export interface Box {
  readonly left: number
  readonly right: number
  /** Measured downward from the top of the page. */
  readonly top: number
  readonly bottom: number
}

export interface Mark extends Box {
  readonly what: 'words' | 'glyph' | 'path'
  readonly text: string
  /** Drawn as furniture; else it belongs to a tag. */
  readonly artifact: boolean
  readonly tagged: boolean
  /** What it is read as. */
  readonly actual: string | undefined
  /** Marks of one formula row share it. */
  readonly group: number
  readonly size: number
}

export interface Page {
  readonly width: number
  readonly height: number
  readonly marks: readonly Mark[]
}

export const pagesOf = (bytes: Uint8Array): readonly Page[] => {
  const pdf = readPdf(bytes)
  const pages = pdf.get(entry(pdf.get(entry(pdf.trailer, 'Root')), 'Pages'))
  return listOf(entry(pages, 'Kids')).map((kid) => pageOf(pdf, pdf.get(kid)))
}

type Matrix = readonly [number, number, number, number, number, number]
const times = (m: Matrix, n: Matrix): Matrix => [
  m[0] * n[0] + m[1] * n[2],
  m[0] * n[1] + m[1] * n[3],
  m[2] * n[0] + m[3] * n[2],
  m[2] * n[1] + m[3] * n[3],
  m[4] * n[0] + m[5] * n[2] + n[4],
  m[4] * n[1] + m[5] * n[3] + n[5],
]
const ONE: Matrix = [1, 0, 0, 1, 0, 0]

interface State {
  readonly ctm: Matrix
  readonly font: Font | undefined
  readonly size: number
  readonly stretch: number
  readonly spacing: number
  readonly group: number
}

function pageOf(pdf: Pdf, page: Value | undefined): Page {
  const [, , width = 0, height = 0] = listOf(entry(page, 'MediaBox')) as number[]
  const resources = pdf.get(entry(page, 'Resources'))
  const marks: Mark[] = []
  const content = pdf.stream(entry(page, 'Contents'))
  const opened: { artifact: boolean; tagged: boolean; actual: string | undefined }[] = []
  const stack: State[] = []
  let state: State = { ctm: ONE, font: undefined, size: 0, stretch: 1, spacing: 0, group: 0 }
  let groups = 0
  let text = ONE
  let path: [number, number][] = []
  const add = (what: Mark['what'], points: readonly (readonly [number, number])[], ctm: Matrix, words = ''): void => {
    const xs = points.map(([x, y]) => ctm[0] * x + ctm[2] * y + ctm[4])
    const ys = points.map(([x, y]) => height - (ctm[1] * x + ctm[3] * y + ctm[5]))
    marks.push({
      ...{ what, text: words, group: state.group, size: state.size },
      ...{ left: Math.min(...xs), right: Math.max(...xs), top: Math.min(...ys), bottom: Math.max(...ys) },
      artifact: opened.some((mark) => mark.artifact),
      tagged: opened.some((mark) => mark.tagged),
      actual: opened.findLast((mark) => mark.actual !== undefined)?.actual,
    })
  }
  const show = (pieces: readonly Value[]): void => {
    const { font, size, stretch } = state
    let words = ''
    let advance = 0
    for (const piece of pieces) {
      if (typeof piece === 'number') advance -= (piece / 1000) * size * stretch
      for (const code of codesOf(piece)) {
        words += font!.unicode[code] ?? ''
        advance += (((font!.widths[code] ?? 0) / 1000) * size + state.spacing) * stretch
      }
    }
    const trimmed = words.trimEnd()
    const blank = ((font!.widths[font!.unicode.indexOf(' ')] ?? 0) / 1000) * size * stretch
    const end = advance - (words.length - trimmed.length) * blank - (trimmed === '' ? 0 : state.spacing)
    const [up, down] = [0.74 * size, -0.2 * size]
    if (trimmed !== '' || opened.at(-1)?.actual !== undefined)
      add(
        'words',
        [
          [0, up],
          [trimmed === '' ? advance : end, up],
          [0, down],
          [trimmed === '' ? advance : end, down],
        ],
        times(text, state.ctm),
        trimmed,
      )
    text = times([1, 0, 0, 1, advance, 0], text)
  }
  const operators: Readonly<Record<string, (args: readonly Value[]) => void>> = {
    q: () => {
      stack.push(state)
      groups += 1
      state = { ...state, group: stack.length > 1 ? state.group : groups }
    },
    Q: () => {
      state = stack.pop()!
    },
    cm: (args) => {
      state = { ...state, ctm: times(args as unknown as Matrix, state.ctm) }
    },
    BT: () => {
      text = ONE
    },
    Tm: (args) => {
      text = args as unknown as Matrix
    },
    Tf: ([name, size]) => {
      const font = entry(pdf.get(entry(resources, 'Font')), nameOf(name)!)
      state = { ...state, font: fontOf(pdf, font), size: size as number }
    },
    Tz: ([percent]) => {
      state = { ...state, stretch: (percent as number) / 100 }
    },
    Tc: ([spacing]) => {
      state = { ...state, spacing: spacing as number }
    },
    Tj: (args) => show(args),
    TJ: ([pieces]) => show(listOf(pieces)),
    Do: ([name]) => {
      const form = pdf.get(entry(pdf.get(entry(resources, 'XObject')), nameOf(name)!))
      const [left = 0, bottom = 0, right = 0, top = 0] = listOf(entry(form, 'BBox')) as number[]
      add(
        'glyph',
        [
          [left, bottom],
          [right, bottom],
          [left, top],
          [right, top],
        ],
        state.ctm,
      )
    },
    re: (args) => {
      const [x, y, w, h] = args as [number, number, number, number]
      path.push([x, y], [x + w, y + h])
    },
    BDC: ([tag, options]) => {
      opened.push({
        artifact: nameOf(tag) === 'Artifact',
        tagged: entry(options, 'MCID') !== undefined,
        actual: stringOf(entry(options, 'ActualText')),
      })
    },
    BMC: ([tag]) => {
      opened.push({ artifact: nameOf(tag) === 'Artifact', tagged: false, actual: undefined })
    },
    EMC: () => {
      if (opened.pop() === undefined) throw new Error('a mark ends that was not begun')
    },
    ...Object.fromEntries(
      ['m', 'l', 'c', 'v'].map((operator) => [
        operator,
        (args: readonly Value[]) => {
          for (let index = 0; index < args.length; index += 2)
            path.push([args[index] as number, args[index + 1] as number])
        },
      ]),
    ),
    ...Object.fromEntries(
      ['f', 'S', 'B', 'n'].map((operator) => [
        operator,
        () => {
          if (operator !== 'n' && path.length > 0) add('path', path, state.ctm)
          path = []
        },
      ]),
    ),
  }
  let args: Value[] = []
  for (let position = skip(content, 0); position < content.length; position = skip(content, position)) {
    const [value, end] = parse(content, position)
    position = end
    const operator = nameOf(value)
    if (operator?.startsWith('!') !== true) {
      args.push(value)
      continue
    }
    operators[operator.slice(1)]?.(args)
    args = []
  }
  if (opened.length > 0 || stack.length > 0) throw new Error('marks or states are left open at the end of a page')
  return { width, height, marks }
}

interface Font {
  readonly widths: readonly number[]
  readonly unicode: readonly string[]
}

const fonts = new WeakMap<Pdf, Map<number, Font>>()

function fontOf(pdf: Pdf, font: Value | undefined): Font {
  const known = fonts.get(pdf) ?? new Map<number, Font>()
  fonts.set(pdf, known)
  const id = refOf(font)!
  const read = known.get(id) ?? readFont(pdf, pdf.get(font))
  known.set(id, read)
  return read
}

function readFont(pdf: Pdf, font: Value | undefined): Font {
  const descendant = pdf.get(listOf(entry(font, 'DescendantFonts'))[0])
  const [, widths] = listOf(entry(descendant, 'W'))
  const map = pdf.stream(entry(font, 'ToUnicode'))
  const unicode: string[] = []
  for (const [, from = '', list = ''] of map.matchAll(/<([0-9a-f]{4})> <[0-9a-f]{4}> \[([^\]]*)\]/g))
    [...list.matchAll(/<([^>]*)>/g)].forEach(([, hex = ''], index) => {
      unicode[Number.parseInt(from, 16) + index] = Buffer.from(hex.replace(/\s/g, ''), 'hex')
        .swap16()
        .toString('utf16le')
    })
  return { widths: listOf(widths) as number[], unicode }
}

function codesOf(value: Value): readonly number[] {
  if (typeof value !== 'object' || value === null || !('bytes' in value)) return []
  return Array.from(
    { length: value.bytes.length / 2 },
    (_, index) => value.bytes.charCodeAt(index * 2) * 256 + value.bytes.charCodeAt(index * 2 + 1),
  )
}
