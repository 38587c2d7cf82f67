/** Where a number or a row comes from: read in print, common practice of the trade, from memory, or our own choice. */
export type SourceKind = 'published' | 'commonPractice' | 'memory' | 'house'

/** The origin of a value: its kind and the words that let a person find it or dispute it. */
export interface Provenance {
  readonly source: SourceKind
  readonly citation: string
}

/** A value that never travels without its origin. */
export interface Sourced<T> extends Provenance {
  readonly value: T
}
