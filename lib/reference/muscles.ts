import type { Provenance } from '@/lib/reference/sourced';

/** A muscle that responses are recorded from. `mainRoots` is the part of `roots` that carries most of it. */
export interface Muscle extends Provenance {
  readonly short: string
  readonly name: string
  readonly nerve: string
  readonly roots: readonly string[]
  readonly mainRoots: readonly string[]
}

const anatomy: Provenance = { source: 'memory', citation: 'Standard anatomy, from memory' };

/**
 * The muscles of the templates, with nerve and roots.
 *
 * Method: one row for each muscle as anatomy usually has it. Variants (Martin-Gruber anastomosis,
 * accessory deep fibular nerve) are not shown; with one of them a muscle answers from another nerve.
 *
 * @returns rows of short name, full name, nerve, roots and main roots, each with its origin
 * @source from memory (standard anatomy)
 * @accuracy not measured; tests/lib/reference/muscles.test.ts checks the form of each row only
 * @example
 * muscles.find((muscle) => muscle.short === 'ADM')?.nerve // => 'ulnar'
 */
export const muscles: readonly Muscle[] = [
  { short: 'ADM', name: 'Abductor digiti minimi', nerve: 'ulnar', roots: ['C8', 'T1'], mainRoots: ['T1'], ...anatomy },
  { short: 'FDI', name: 'First dorsal interosseous', nerve: 'ulnar, deep branch', roots: ['C8', 'T1'], mainRoots: ['T1'], ...anatomy },
  { short: 'FCU', name: 'Flexor carpi ulnaris', nerve: 'ulnar', roots: ['C7', 'C8', 'T1'], mainRoots: ['C8'], ...anatomy },
  { short: 'APB', name: 'Abductor pollicis brevis', nerve: 'median, recurrent branch', roots: ['C8', 'T1'], mainRoots: ['T1'], ...anatomy },
  { short: 'EDB', name: 'Extensor digitorum brevis', nerve: 'deep fibular', roots: ['L5', 'S1'], mainRoots: ['S1'], ...anatomy },
  { short: 'TA', name: 'Tibialis anterior', nerve: 'deep fibular', roots: ['L4', 'L5'], mainRoots: ['L5'], ...anatomy },
  { short: 'FL', name: 'Fibularis longus', nerve: 'superficial fibular', roots: ['L5', 'S1'], mainRoots: ['L5'], ...anatomy },
  { short: 'EHL', name: 'Extensor hallucis longus', nerve: 'deep fibular', roots: ['L5'], mainRoots: ['L5'], ...anatomy },
  { short: 'AH', name: 'Abductor hallucis', nerve: 'medial plantar', roots: ['S1', 'S2'], mainRoots: ['S1'], ...anatomy },
  { short: 'GM', name: 'Gastrocnemius, medial head', nerve: 'tibial', roots: ['S1', 'S2'], mainRoots: ['S1'], ...anatomy },
];
