import type { z } from 'zod';

/** The contract of an answer, as far as reading it needs one. */
export type Contract<Answer> = z.ZodType<Answer>;
