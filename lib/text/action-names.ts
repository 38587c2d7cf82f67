/**
 * What a person does, with the same name on the button and in the log.
 *
 * @returns rows of action and its name, sentence case
 * @source trade's own words: told, read back, surgeon's action; the rest plain English (house rule)
 * @accuracy exact; tests/lib/text/entry-sentence.test.ts
 * @example
 * actionNames.told // => 'Told'
 */
export const actionNames = {
  told: 'Told',
  readBack: 'Read back',
  acted: 'Surgeon’s action',
  ended: 'End',
  openCase: 'Open case',
  closeCase: 'Close case',
  timeout: 'Time-out',
  phase: 'Phase',
  baseline: 'Accept baseline',
  correction: 'Correction',
  distances: 'Measure distances',
  message: 'Message',
  advice: 'Advice',
  adviceConfirmed: 'Advice confirmed',
  baselineConfirmed: 'Baseline accepted by the physician',
  examination: 'Examination',
} as const;
