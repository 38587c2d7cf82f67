import type { z } from 'zod';
import { secretVariables } from './settings-schema';
import { SettingsFailure } from './settings-failure';

export type Environment = Readonly<Record<string, string | undefined>>;

/** Reads the variables a schema names and refuses the first wrong one with its name, its value and what is allowed. */
export function parseEnvironment<Schema extends z.ZodType>(schema: Schema, environment: Environment): z.output<Schema> {
  const parsed = schema.safeParse(environment);
  if (parsed.success) return parsed.data;
  const issue = parsed.error.issues[0];
  const variable = String(issue?.path[0] ?? 'The environment');
  const value = environment[variable];
  if (value === undefined || value === '') throw new SettingsFailure(`${variable} is not set; it must be ${issue?.message}.`);
  const shown = secretVariables.has(variable) ? `with ${value.length} characters (not shown)` : JSON.stringify(value.slice(0, 200));
  throw new SettingsFailure(`${variable} is ${shown}; it must be ${issue?.message}.`);
}
