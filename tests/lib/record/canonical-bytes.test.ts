import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { canonicalBytes } from '@/lib/record/canonical-bytes';
import { jsonBody } from './record-arbitraries';

const textOf = (value: unknown) => new TextDecoder().decode(canonicalBytes(value));

// Vectors published beside RFC 8785 (github.com/cyberphone/json-canonicalization, testdata/input and testdata/output),
// the array's output and the number samples of appendix B apart: those are marked below.
const vectors: readonly (readonly [name: string, input: string, output: string])[] = [
  ['french', '{"peach":"This sorting order","péché":"is wrong according to French","pêche":"but canonicalization MUST","sin":"ingnore locale"}',
    '{"peach":"This sorting order","péché":"is wrong according to French","pêche":"but canonicalization MUST","sin":"ingnore locale"}'],
  ['structures', '{"1":{"f":{"f":"hi","F":5},"\\n":56.0},"10":{},"":"empty","a":{},"111":[{}],"A":{}}',
    '{"":"empty","1":{"\\n":56,"f":{"F":5,"f":"hi"}},"10":{},"111":[{}],"A":{},"a":{}}'],
  ['unicode', '{"Unnormalized Unicode":"\\u1e0d\\u0307"}', '{"Unnormalized Unicode":"\u1e0d\u0307"}'],
  ['values', '{"numbers":[1E30,4.50,333333333.33333329,2e-3,0.000000000000000000000000001],"escaping":"\\u20ac$\\u000F\\u000aA\'\\u0042\\u0022\\u005c\\\\\\"\\/","literals":[null,true,false]}',
    '{"escaping":"\u20ac$\\u000f\\nA\'B\\"\\\\\\\\\\"/","literals":[null,true,false],"numbers":[1e+30,4.5,333333333.3333333,0.002,1e-27]}'],
  ['weird', '{"\\u20ac":"Euro Sign","1":"One","\\u0080":"Control\\u007f","\\ud83d\\ude02":"Smiley","\\u00f6":"Latin Small Letter O With Diaeresis","\\ufb33":"Hebrew Letter Dalet With Dagesh","</script>":"Browser Challenge"}',
    '{"1":"One","</script>":"Browser Challenge","\u0080":"Control\u007f","\u00f6":"Latin Small Letter O With Diaeresis","\u20ac":"Euro Sign","\ud83d\ude02":"Smiley","\ufb33":"Hebrew Letter Dalet With Dagesh"}'],
  ['arrays (input published, output by hand)', '[56,{"d":true,"10":null,"1":[]}]', '[56,{"1":[],"10":null,"d":true}]'],
];

// From the sample lines of the number test file described beside the vectors (hexadecimal IEEE 754, expected text).
const numbers: readonly (readonly [bits: string, text: string])[] = [
  ['4340000000000001', '9007199254740994'],
  ['4340000000000002', '9007199254740996'],
  ['444b1ae4d6e2ef50', '1e+21'],
  ['3eb0c6f7a0b5ed8d', '0.000001'],
  ['3eb0c6f7a0b5ed8c', '9.999999999999997e-7'],
  ['8000000000000000', '0'],
  ['0000000000000000', '0'],
];

describe('canonicalBytes', () => {
  test.each(vectors)('writes the published vector %s byte for byte', (_name, input, output) => {
    expect(Buffer.from(canonicalBytes(JSON.parse(input)))).toEqual(Buffer.from(output, 'utf8'));
  });

  test.each(numbers)('writes the double with bits %s as %s', (bits, text) => {
    expect(textOf(Buffer.from(bits, 'hex').readDoubleBE(0))).toBe(text);
  });

  const refused: readonly (readonly [name: string, value: unknown, sentence: string])[] = [
    ['NaN', { onsetMs: Number.NaN }, 'value.onsetMs is NaN; only finite numbers are allowed.'],
    ['Infinity', [Number.POSITIVE_INFINITY], 'value[0] is Infinity; only finite numbers are allowed.'],
    ['a lone surrogate', { text: 'a\ud800b' }, 'value.text has a lone surrogate; only well-formed Unicode is allowed.'],
    ['a lone surrogate in a key', { ['\udc00']: 1 }, 'A key of value has a lone surrogate; only well-formed Unicode is allowed.'],
    ['undefined', { text: undefined }, 'value.text is undefined; an entry holds JSON only.'],
    ['undefined in an array', [1, undefined], 'value[1] is undefined; an entry holds JSON only.'],
    ['a hole in an array', new Array<number>(1), 'value[0] is undefined; an entry holds JSON only.'],
    ['a bigint', 1n, 'value is bigint; an entry holds JSON only.'],
    ['a function', { act: () => 1 }, 'value.act is function; an entry holds JSON only.'],
    ['a date', { at: new Date(0) }, 'value.at is not a plain object; an entry holds JSON only.'],
    ['a symbol for a key', { [Symbol('hidden')]: 1 }, 'value has a symbol for a key; an entry holds JSON only.'],
    ['NUL', { text: 'a\u0000b' }, 'value.text has a NUL character; the database cannot hold it.'],
  ];
  test.each(refused)('refuses %s with its place', (_name, value, sentence) => {
    expect(() => canonicalBytes(value)).toThrow(new RangeError(sentence));
  });

  test('keeps the value: what is read back is equal, −0 written as 0 apart', () => {
    fc.assert(
      fc.property(jsonBody, (body) => {
        const plain = JSON.parse(JSON.stringify(body)) as unknown;
        expect(JSON.parse(textOf(body))).toEqual(plain);
      }),
    );
  });

  test('does not depend on the order in which keys were written', () => {
    fc.assert(
      fc.property(jsonBody, (body) => {
        const reversed = Object.fromEntries(Object.entries(body).reverse());
        expect(textOf(reversed)).toBe(textOf(body));
      }),
    );
  });
});
