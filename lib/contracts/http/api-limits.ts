/**
 * How much a program may ask at a time. The server holds each of these, and the interface's description says them.
 * @source house rule: a desk that logs as fast as a person can stays far below each of them
 */
export const apiLimits = {
  /** Requests of one token in a second, on the average. */
  requestsPerSecond: 200,
  /** Requests of one token at once. */
  requestsAtOnce: 400,
  /** Body of one request: a whole plan is under a third of it. */
  bodyBytes: 65_536,
  /** Entries in one page of a log. */
  pageEntries: 500,
  /** Lines in a list of cases. */
  listedCases: 200,
} as const;
