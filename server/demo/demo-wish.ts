import { SetupFailure } from '@/server/setup/setup-failure.mjs';
import type { Scenario } from '@/server/demo/scenario';
import { scenarios } from '@/server/demo/scenarios/scenarios';

/** What a person asked for at the terminal. */
export interface DemoWish {
  readonly scenario: Scenario;
  readonly speed: number;
  readonly url: string | null;
  readonly isList: boolean;
}

/** Fastest playing: at 1,000 nearly no wait is left. House rule. */
const fastest = 1000;
const usage = 'npm run demo -- [--scenario NAME] [--speed N] [--url URL] [--list]';

/** Reads the words after `npm run demo --`. A word that is not known stops with one sentence. */
export function demoWish(words: readonly string[]): DemoWish {
  const wish = { scenario: scenarios[0], speed: 1, url: null as string | null, isList: false };
  for (let at = 0; at < words.length; at += 1) {
    const [word = '', inline] = (words[at] ?? '').split(/=(.*)/s);
    if (word === '--list' && inline === undefined) {
      wish.isList = true;
      continue;
    }
    if (!['--scenario', '--speed', '--url'].includes(word)) throw wrong(`"${words[at]}" is not known here; it is ${usage}.`);
    const value = inline ?? words[(at += 1)];
    if (value === undefined || value === '') throw wrong(`${word} needs a value; it is ${usage}.`);
    if (word === '--scenario') wish.scenario = scenarioNamed(value);
    if (word === '--speed') wish.speed = speedOf(value);
    if (word === '--url') wish.url = originOf(value);
  }
  return wish;
}

function wrong(sentence: string): SetupFailure {
  return new SetupFailure('wrongSetting', sentence);
}

function scenarioNamed(name: string): Scenario {
  const found = scenarios.find((scenario) => scenario.name === name);
  if (found === undefined) throw wrong(`There is no scenario "${name}"; there are ${scenarios.map((scenario) => scenario.name).join(', ')}.`);
  return found;
}

function speedOf(text: string): number {
  const speed = /^\d+(\.\d+)?$/.test(text) ? Number(text) : Number.NaN;
  if (speed >= 1 && speed <= fastest) return speed;
  throw wrong(`--speed is "${text}"; it must be a number from 1 to ${fastest}.`);
}

function originOf(text: string): string {
  const url = URL.canParse(text) ? new URL(text) : null;
  if (url !== null && /^https?:$/.test(url.protocol) && url.pathname === '/' && url.search === '' && url.hash === '' && url.username === '') return url.origin;
  throw wrong(`--url is "${text}"; it must be an address such as http://127.0.0.1:4050, without a path.`);
}
