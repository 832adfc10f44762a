/** Checks of the program against outside sources, as values: tests assert them, window, sheet and command show them. */

export interface EvidenceCase {
  readonly id: string
  /** What the source gives: "greatest moment", in words. */
  readonly what: string
  /** Title, edition, and the place in it. */
  readonly source: string
  /** How the printed value is known: seen in the source, or recalled from it. */
  readonly known: 'read' | 'from memory' | 'arithmetic from the source’s inputs'
  readonly printed: number
  readonly unit: string
  /** Greatest difference allowed, in the same unit: half of the last printed digit unless `why` says otherwise. */
  readonly tolerance: number
  readonly why?: string
  /** The value as this program has it, in the same unit. */
  readonly compute: () => number
}

export interface EvidenceResult extends EvidenceCase {
  readonly computed: number
  readonly difference: number
  readonly within: boolean
}
