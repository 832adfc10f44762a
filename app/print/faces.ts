/** The typefaces: IBM Plex Sans, whose figures are all of one width, and DejaVu Sans for signs that it lacks. */
import { createRequire } from 'node:module'
import { basename } from 'node:path'
import { fileURLToPath } from 'node:url'
import type { Face } from './hand.ts'

/** Files inside their packages; TrueType, the one kind that is embedded without loss of time. */
export const FILES = {
  regular: '@expo-google-fonts/ibm-plex-sans/400Regular/IBMPlexSans_400Regular.ttf',
  semibold: '@expo-google-fonts/ibm-plex-sans/600SemiBold/IBMPlexSans_600SemiBold.ttf',
  regularSigns: 'dejavu-fonts-ttf/ttf/DejaVuSans.ttf',
  semiboldSigns: 'dejavu-fonts-ttf/ttf/DejaVuSans-Bold.ttf',
} as const

export type FaceFile = keyof typeof FILES

/** What one face draws of a text. */
export interface Run {
  readonly file: FaceFile
  readonly text: string
}

export interface Faces {
  /** A text as runs of one face each. What no face draws is given to the first one: `undrawn` finds it beforehand. */
  runs(text: string, face: Face): readonly Run[]
  /** The characters of a text that no face draws, each once. */
  undrawn(text: string): readonly string[]
}

/**
 * Path of a face's file, by which documents know it too: the library reads a font anew at every use where one file goes by
 * two names.
 */
export const faceFile = (file: FaceFile): string => PATHS[file]

/** In a bundle the files stand beside it: the build puts them there. */
const find = (file: string): string =>
  import.meta.url.endsWith('.ts')
    ? createRequire(import.meta.url).resolve(file)
    : fileURLToPath(new URL(basename(file), import.meta.url))
const PATHS: Readonly<Record<FaceFile, string>> = {
  regular: find(FILES.regular),
  semibold: find(FILES.semibold),
  regularSigns: find(FILES.regularSigns),
  semiboldSigns: find(FILES.semiboldSigns),
}

/** The faces of a document. */
export function facesOf(doc: PDFKit.PDFDocument): Faces {
  const known = new Map<string, FaceFile | undefined>()
  const has = (file: FaceFile, character: string): boolean => {
    doc.font(faceFile(file))
    return fontOf(doc).hasGlyphForCodePoint(character.codePointAt(0)!)
  }
  /** Which file draws a character. */
  const fileFor = (character: string, face: Face): FaceFile | undefined => {
    const key = `${face} ${character}`
    if (!known.has(key)) {
      const signs = `${face}Signs` as const
      const found = NEVER.test(character)
        ? undefined
        : has(face, character)
          ? face
          : SIGN.test(character) && !PICTURE.test(character) && has(signs, character)
            ? signs
            : undefined
      known.set(key, found)
    }
    return known.get(key)
  }
  return {
    runs: (text, face) => {
      const runs: { file: FaceFile; text: string }[] = []
      for (const character of text) {
        const last = runs.at(-1)
        // A mark stays with the letter it stands on.
        const file = MARK.test(character) && last ? last.file : (fileFor(character, face) ?? face)
        if (last?.file === file) last.text += character
        else runs.push({ file, text: character })
      }
      return runs
    },
    undrawn: (text) => [
      ...new Set(
        Array.from(text).filter(
          (character) => fileFor(character, 'regular') === undefined || fileFor(character, 'semibold') === undefined,
        ),
      ),
    ],
  }
}

/** Scripts that are set left to right without joining; signs that belong to none. */
const SIGN = /[\p{Script=Latin}\p{Script=Greek}\p{Script=Cyrillic}\p{Script=Common}\p{Script=Inherited}]/u
const PICTURE = /\p{Extended_Pictographic}/u
const MARK = /\p{M}/u
/** Controls, also those that turn the direction of writing: nothing would show of them. */
const NEVER = /[\p{Cc}\u200e\u200f\u202a-\u202e\u2066-\u2069]/u

/** The font reader behind the face in use, which pdfkit keeps to itself. */
const fontOf = (doc: PDFKit.PDFDocument): { hasGlyphForCodePoint(codePoint: number): boolean } =>
  (doc as unknown as { _font: { font: { hasGlyphForCodePoint(codePoint: number): boolean } } })._font.font
