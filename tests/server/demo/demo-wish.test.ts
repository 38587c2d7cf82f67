import { describe, expect, test } from 'vitest';

import { assertDemoServer } from '@/server/demo/assert-demo-server';
import { demoWish } from '@/server/demo/demo-wish';

describe('demoWish', () => {
  test('plays the ulnar case at speed 1 when nothing is said', () => {
    expect(demoWish([])).toMatchObject({ scenario: { name: 'ulnar' }, speed: 1, url: null, isList: false });
  });

  test.each([
    [['--speed', '20'], { speed: 20 }],
    [['--speed=1000', '--scenario=tourniquet'], { speed: 1000, scenario: { name: 'tourniquet' } }],
    [['--speed', '1'], { speed: 1 }],
    [['--url', 'http://localhost:4051/'], { url: 'http://localhost:4051' }],
    [['--list'], { isList: true }],
  ])('%j', (words, wish) => expect(demoWish(words)).toMatchObject(wish));

  test.each([
    [['--speed', '0.9'], '--speed is "0.9"; it must be a number from 1 to 1000.'],
    [['--speed', '1001'], '--speed is "1001"; it must be a number from 1 to 1000.'],
    [['--speed', '-5'], '--speed is "-5"; it must be a number from 1 to 1000.'],
    [['--speed', '1e2'], '--speed is "1e2"; it must be a number from 1 to 1000.'],
    [['--speed'], /^--speed needs a value; it is npm run demo/],
    [['--scenario', 'elbow'], 'There is no scenario "elbow"; there are ulnar, tumour, neuroma, relaxant, tourniquet.'],
    [['--url', '127.0.0.1:4050'], /^--url is "127\.0\.0\.1:4050"; it must be an address such as /],
    [['--url', 'http://127.0.0.1:4050/cases'], /must be an address such as/],
    [['fast'], /^"fast" is not known here; it is npm run demo/],
  ])('%j is one sentence and exit status 2', (words, sentence) => {
    expect(() => demoWish(words)).toThrow(expect.objectContaining({ status: 2, message: expect.stringMatching(sentence) as string }));
  });
});

describe('assertDemoServer', () => {
  const answering = (status: number): typeof fetch => () => Promise.resolve(new Response('{}', { status }));
  const never: typeof fetch = () => Promise.reject(new Error('must not be asked'));

  test('lets a demo on this machine pass', () => expect(assertDemoServer('http://127.0.0.1:4050', answering(200))).resolves.toBeUndefined());
  test('asks no machine but this one', () => expect(assertDemoServer('https://fascicle.example.org', never)).rejects.toThrow(/is not on this machine/));
  test('refuses a server that is no demo', () => expect(assertDemoServer('http://127.0.0.1:4050', answering(404))).rejects.toThrow(/is not in demo mode/));
  test('says when nothing answers', () => expect(assertDemoServer('http://127.0.0.1:4050', never)).rejects.toThrow(/^Nothing answers at http:\/\/127\.0\.0\.1:4050; start the server/));
});
