/** A calc sheet to PDF: measured, laid on pages, drawn. */
import PDFDocument from 'pdfkit'
import type { Block, Sheet } from '../../core/sheet/types.ts'
import { glyphForms } from './draw-formula.ts'
import { entriesSlabs } from './entries.ts'
import { faceFile, facesOf } from './faces.ts'
import { figureSlab, sealSlab } from './figure.ts'
import { flow, keptOn, type Slab } from './flow.ts'
import { furnitureOf } from './furniture.ts'
import { frameOf, type Paper } from './hand.ts'
import type { Pen } from './pen.ts'
import { headingSlab, paragraphSlabs } from './prose.ts'
import { tableSlabs } from './table.ts'
import { unprintableIn } from './unprintable.ts'
import { verdictSlab, workingSlabs } from './working.ts'

export interface PrintOptions {
  /** Told after each step; blocks count twice, once when they are measured and once when they are drawn. */
  readonly onProgress?: (done: number, of: number) => void
  readonly signal?: AbortSignal
}

/**
 * Prints a sheet. The same sheet on the same paper gives the same bytes. Rejects with UnprintableText where the sheet has
 * characters that cannot be drawn, before anything is made, and with the signal's reason where it is stopped.
 */
export async function printSheet(sheet: Sheet, paper: Paper, options: PrintOptions = {}): Promise<Uint8Array> {
  const { doc, pen } = newDocument(sheet, paper)
  const fault = unprintableIn(sheet, pen.faces)
  if (fault) throw fault
  const of = sheet.blocks.length * 2
  const step = async (done: number): Promise<void> => {
    options.onProgress?.(done, of)
    await breath()
    options.signal?.throwIfAborted()
  }
  await step(0)

  const furniture = furnitureOf(pen, sheet)
  const outline = outliner(doc)
  const slabs: Slab[] = []
  /** Index of the first slab after each block. */
  const ends: number[] = []
  for (let index = 0; index < sheet.blocks.length; index += 1) {
    const block = sheet.blocks[index]!
    const next = sheet.blocks[index + 1]
    if (block.block === 'working' && next?.block === 'verdict') {
      slabs.push(...workingSlabs(pen, block.lines, spaceAbove(sheet.blocks[index - 1]), next))
      ends.push(slabs.length)
      index += 1
    } else {
      const before = sheet.blocks[index - 1]
      const own = slabsOf(pen, block, outline, before)
      // What a heading is followed by leads over to the table, drawing or working that it speaks of.
      const leads = block.block === 'paragraph' && before?.block === 'heading' && own.length === 1
      slabs.push(...keptOn(own, leads && next !== undefined && !PROSE.has(next.block)))
    }
    ends.push(slabs.length)
    await step(index + 1)
  }

  const pages = flow(slabs, furniture.room)
  for (const [number, page] of pages.entries()) {
    doc.addPage()
    furniture.draw(number + 1, pages.length)
    for (const { index, top, head } of page) {
      const slab = slabs[index]!
      if (head) slab.head!.draw(pen, furniture.top + top - slab.head!.height)
      slab.draw(pen, furniture.top + top)
    }
    const drawn = (page.at(-1)?.index ?? -1) + 1
    await step(sheet.blocks.length + ends.filter((end) => end <= drawn).length)
  }
  pen.root.end()
  doc.end()
  return bytesOf(doc)
}

function slabsOf(pen: Pen, block: Block, outline: Outline, before: Block | undefined): readonly Slab[] {
  switch (block.block) {
    case 'heading':
      return [headingSlab(pen, block, outline, before?.block === 'heading')]
    case 'paragraph':
      return paragraphSlabs(pen, block)
    case 'table':
      return tableSlabs(pen, block)
    case 'entries':
      return entriesSlabs(pen, block.rows)
    case 'working':
      return workingSlabs(pen, block.lines, spaceAbove(before))
    case 'verdict':
      return [verdictSlab(pen, block)]
    case 'figure':
      return [figureSlab(pen, block)]
    case 'seal':
      return [sealSlab(pen, block.text)]
  }
}

const PROSE: ReadonlySet<Block['block']> = new Set(['heading', 'paragraph', 'seal'])

/** Above a working: more below a table or drawing than below the words that lead over to it. */
const spaceAbove = (before: Block | undefined): number =>
  before?.block === 'table' || before?.block === 'entries' || before?.block === 'figure' ? 10 : 5

function newDocument(sheet: Sheet, paper: Paper): { readonly doc: PDFKit.PDFDocument; readonly pen: Pen } {
  const frame = frameOf(paper)
  const { title } = sheet
  const doc = new PDFDocument({
    size: [frame.width, frame.height],
    margin: 0,
    autoFirstPage: false,
    pdfVersion: '1.7',
    tagged: true,
    lang: 'en',
    displayTitle: true,
    font: faceFile('regular'),
    info: {
      Title: escapable(joined([title.number, title.project, title.subject], ', ') || 'Calc sheet'),
      Author: escapable(title.preparedBy),
      Subject: escapable(joined([title.subject, title.revision && `revision ${title.revision}`, sheet.basis], ', ')),
      Keywords: escapable(`fingerprint ${sheet.fingerprint}`),
      Creator: escapable(sheet.program),
      Producer: escapable(sheet.program),
      CreationDate: dateOf(sheet.date),
    },
  })
  const root = doc.struct('Document')
  doc.addStructure(root)
  return { doc, pen: { doc, faces: facesOf(doc), frame, root, glyph: glyphForms(doc) } }
}

const joined = (words: readonly string[], between: string): string => words.filter((word) => word !== '').join(between)

/**
 * The library writes properties twice, as strings and, unescaped, into XML. This one gives its characters where they are
 * read one by one and its escaped form where it is put into a text.
 */
const escapable = (text: string): string => {
  const escaped = text.replaceAll('&', '&amp;').replaceAll('<', '&lt;').replaceAll('>', '&gt;')
  return Object.assign(new String(text), { toString: () => escaped }) as unknown as string
}

/** The sheet's own date; a fixed one where it has none, so that the same input gives the same bytes. */
function dateOf(date: string): Date {
  const time = Date.parse(date)
  return new Date(Number.isNaN(time) ? 0 : time)
}

type Outline = (level: 1 | 2 | 3, title: string, top: number) => void

/** Bookmarks, each under the last one of a higher level. */
function outliner(doc: PDFKit.PDFDocument): Outline {
  const open: { level: number; item: PDFKit.PDFOutline }[] = []
  return (level, title, top) => {
    while (open.length > 0 && open.at(-1)!.level >= level) open.pop()
    const parent = open.at(-1)?.item ?? doc.outline
    // The library subtracts `left` from the page's width and calls its lower edge the bottom: its left edge is the width.
    const options = { fit: false, top: Math.max(0, top - 8), left: doc.page.width, expanded: level === 1 }
    open.push({ level, item: parent.addItem(title, options) })
  }
}

/** Lets other work of this thread have its turn. */
const breath = (): Promise<void> => new Promise((done) => setImmediate(done))

async function bytesOf(doc: PDFKit.PDFDocument): Promise<Uint8Array> {
  const chunks: Uint8Array[] = []
  for await (const chunk of doc) chunks.push(chunk as Uint8Array)
  return Buffer.concat(chunks)
}
