/** A calc sheet as blocks, in reading order. Print lays them out; the window shows the same ones. */
import type { Figure } from '../figure/types.ts'
import type { Line } from '../formula/types.ts'
import type { UnitSystem } from '../quantity/kinds.ts'

/** What stands in the title block on every page. */
export interface TitleBlock {
  readonly project: string
  readonly subject: string
  readonly number: string
  readonly revision: string
  readonly preparedBy: string
  readonly checkedBy: string
  readonly date: string
}

export interface Column {
  readonly head: string
  readonly align: 'left' | 'right'
  /** Share of the width; columns of one table are weighed against each other. */
  readonly width: number
}

export type Cell =
  | string
  /** A utilisation: figure, rule against its limit, and the word where it fails. */
  | { readonly utilisation: number | null; readonly word: string }

export type Block =
  | { readonly block: 'heading'; readonly level: 1 | 2 | 3; readonly number: string; readonly text: string }
  | {
      readonly block: 'paragraph'
      readonly text: string
      readonly clause?: string
      readonly tone: 'plain' | 'note' | 'caution'
    }
  | {
      readonly block: 'table'
      readonly columns: readonly Column[]
      readonly rows: readonly (readonly Cell[])[]
      readonly caption?: string
    }
  /** Entries as lines of a form; a default is marked, with where it comes from. */
  | {
      readonly block: 'entries'
      readonly rows: readonly {
        readonly label: string
        readonly value: string
        readonly isDefault: boolean
        readonly source?: string
      }[]
    }
  | { readonly block: 'working'; readonly lines: readonly Line[] }
  | { readonly block: 'verdict'; readonly text: string; readonly holds: boolean }
  | { readonly block: 'figure'; readonly figure: Figure; readonly caption: string }
  /** Place for a seal and signature. */
  | { readonly block: 'seal'; readonly text: string }

export interface Sheet {
  readonly title: TitleBlock
  readonly units: UnitSystem
  readonly program: string
  readonly fingerprint: string
  /** Rules and units, beside the fingerprint at each page's foot: "LRFD, US units". */
  readonly basis: string
  /** Whether it is a kept revision; a sheet that is not says so on each page. */
  readonly kept: boolean
  /** Of the job or revision, ISO 8601 date; the document's own date, so that the same input gives the same bytes. Empty: none. */
  readonly date: string
  readonly caution: string
  readonly blocks: readonly Block[]
}
