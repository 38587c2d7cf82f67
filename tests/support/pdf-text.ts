import { inflateSync } from 'node:zlib';

/** Words of one page, in the order in which they were drawn. */
export interface PdfPage {
  readonly text: string;
  readonly widthPt: number;
  readonly heightPt: number;
}

/** The pages of a document written by Chromium: size, and text by each font's own table of letters. Reads no other writer's documents. */
export function readPdf(bytes: Uint8Array): readonly PdfPage[] {
  const source = Buffer.from(bytes).toString('latin1');
  const objects = new Map([...source.matchAll(/(?:^|\n)(\d+) 0 obj\n([\s\S]*?)\nendobj/g)].map((match) => [match[1] ?? '', match[2] ?? '']));
  const object = (reference: string | undefined) => objects.get(reference ?? '') ?? '';
  const letters = new Map<string, ReadonlyMap<number, string>>();
  const lettersOf = (font: string) => {
    const known = letters.get(font) ?? letterTable(streamOf(object(/\/ToUnicode (\d+) 0 R/.exec(object(font))?.[1])));
    letters.set(font, known);
    return known;
  };
  return [...objects.values()]
    .filter((body) => /\/Type \/Page\n/.test(body))
    .map((body) => {
      const [, widthPt = '0', heightPt = '0'] = /\/MediaBox \[0 0 ([\d.]+) ([\d.]+)\]/.exec(body) ?? [];
      const fonts = new Map([...body.matchAll(/\/(F\d+) (\d+) 0 R/g)].map((match) => [match[1] ?? '', match[2] ?? '']));
      const content = streamOf(object(/\/Contents (\d+) 0 R/.exec(body)?.[1]));
      return { text: textOf(content, (name) => ({ table: lettersOf(fonts.get(name) ?? ''), isWide: object(fonts.get(name)).includes('/Type0') })), widthPt: Number(widthPt), heightPt: Number(heightPt) };
    });
}

function streamOf(body: string): string {
  const start = body.indexOf('stream\n');
  const end = body.lastIndexOf('\nendstream');
  if (start < 0 || end < 0) return '';
  return inflateSync(Buffer.from(body.slice(start + 'stream\n'.length, end), 'latin1')).toString('latin1');
}

function letterTable(cmap: string): ReadonlyMap<number, string> {
  const table = new Map<number, string>();
  const letter = (hex: string) => String.fromCharCode(...(hex.match(/.{4}/g) ?? []).map((unit) => Number.parseInt(unit, 16)));
  for (const [, block = ''] of cmap.matchAll(/beginbfchar\n([\s\S]*?)endbfchar/g)) {
    for (const [, code = '', hex = ''] of block.matchAll(/<(\w+)> <(\w+)>/g)) table.set(Number.parseInt(code, 16), letter(hex));
  }
  for (const [, block = ''] of cmap.matchAll(/beginbfrange\n([\s\S]*?)endbfrange/g)) {
    for (const [, from = '', to = '', hex = ''] of block.matchAll(/<(\w+)> <(\w+)> <(\w+)>/g)) {
      const first = Number.parseInt(from, 16);
      for (let code = first; code <= Number.parseInt(to, 16); code += 1) table.set(code, String.fromCharCode(Number.parseInt(hex, 16) + code - first));
    }
  }
  return table;
}

function textOf(content: string, fontOf: (name: string) => { readonly table: ReadonlyMap<number, string>; readonly isWide: boolean }): string {
  let text = '';
  let font = fontOf('');
  for (const [token, name, hex] of content.matchAll(/\/(F\d+) [\d.]+ Tf|<([\dA-F]*)> Tj|\bET\b/g)) {
    if (token === 'ET') text += ' ';
    if (name !== undefined) font = fontOf(name);
    if (hex !== undefined) text += (hex.match(font.isWide ? /.{4}/g : /.{2}/g) ?? []).map((code) => font.table.get(Number.parseInt(code, 16)) ?? '\ufffd').join('');
  }
  return text;
}
