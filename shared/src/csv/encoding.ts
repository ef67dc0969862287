// Bytes of an uploaded file → text, or what the file is instead.

export const encodings = ['utf-8', 'utf-16le', 'utf-16be', 'windows-1252'] as const;
export type Encoding = (typeof encodings)[number];

export interface FileProblem<Code extends string> {
  problem: Code;
  /** One or two sentences: what is wrong and what to do. */
  message: string;
}

export type DecodingProblem = FileProblem<'empty-file' | 'binary-file' | 'wrong-encoding'>;
export interface DecodedText {
  text: string;
  encoding: Encoding;
}

const saveAsCsv = 'Open it in the program it comes from and save it as CSV (comma separated values, UTF-8), then send that file.';

/** First bytes of files that are often renamed to .csv. */
const signatures: readonly { name: string; bytes: readonly number[]; at?: number }[] = [
  { name: 'a spreadsheet or zip file', bytes: [0x50, 0x4b, 0x03, 0x04] },
  { name: 'an empty zip file', bytes: [0x50, 0x4b, 0x05, 0x06] },
  { name: 'an old spreadsheet or office file', bytes: [0xd0, 0xcf, 0x11, 0xe0, 0xa1, 0xb1, 0x1a, 0xe1] },
  { name: 'a PDF document', bytes: [0x25, 0x50, 0x44, 0x46, 0x2d] },
  { name: 'a PNG picture', bytes: [0x89, 0x50, 0x4e, 0x47] },
  { name: 'a JPEG picture', bytes: [0xff, 0xd8, 0xff] },
  { name: 'a GIF picture', bytes: [0x47, 0x49, 0x46, 0x38] },
  { name: 'a WebP picture', bytes: [0x57, 0x45, 0x42, 0x50], at: 8 },
  { name: 'a gzip archive', bytes: [0x1f, 0x8b] },
  { name: 'a database file', bytes: [0x53, 0x51, 0x4c, 0x69, 0x74, 0x65, 0x20, 0x66, 0x6f, 0x72, 0x6d, 0x61, 0x74] },
];

function binaryKind(bytes: Uint8Array): string | undefined {
  return signatures.find(({ bytes: mark, at = 0 }) => mark.every((byte, i) => bytes[at + i] === byte))?.name;
}

function binary(name: string): DecodingProblem {
  return { problem: 'binary-file', message: `This is ${name}, not a CSV file. ${saveAsCsv}` };
}

function wrongEncoding(message: string): DecodingProblem {
  return { problem: 'wrong-encoding', message: `${message} Save the file again as CSV in UTF-8, or say which encoding it has.` };
}

/** Bytes looked at to tell text from other things. */
const sampleBytes = 65_536;

/** UTF-16 without a mark: nearly every second byte of a table of Latin letters and figures is 0. */
function utf16ByZeros(bytes: Uint8Array): Encoding | undefined {
  const length = Math.min(bytes.length, sampleBytes) & ~1;
  if (length < 4) return undefined;
  let [even, odd] = [0, 0];
  for (let i = 0; i < length; i += 2) {
    if (bytes[i] === 0) even++;
    if (bytes[i + 1] === 0) odd++;
  }
  const half = length / 2;
  if (odd > 0.6 * half && even < 0.02 * half) return 'utf-16le';
  if (even > 0.6 * half && odd < 0.02 * half) return 'utf-16be';
  return undefined;
}

/** More control characters than one in a hundred is no table. */
function looksBinary(bytes: Uint8Array): boolean {
  let controls = 0;
  const length = Math.min(bytes.length, sampleBytes);
  for (let i = 0; i < length; i++) {
    const byte = bytes[i] as number;
    if (byte < 0x20 && byte !== 0x09 && byte !== 0x0a && byte !== 0x0d && byte !== 0x0c) controls++;
  }
  return controls > length / 100;
}

const marks: readonly { encoding: Encoding; bytes: readonly number[] }[] = [
  { encoding: 'utf-8', bytes: [0xef, 0xbb, 0xbf] },
  { encoding: 'utf-16le', bytes: [0xff, 0xfe] },
  { encoding: 'utf-16be', bytes: [0xfe, 0xff] },
];

function markOf(bytes: Uint8Array): Encoding | undefined {
  return marks.find(({ bytes: mark }) => mark.every((byte, i) => bytes[i] === byte))?.encoding;
}

// Windows-1252 gives 0x80 to 0x9F these characters (WHATWG Encoding, index windows-1252); five of them are unassigned.
const windows1252 = '€\u0081‚ƒ„…†‡ˆ‰Š‹Œ\u008DŽ\u008F\u0090‘’“”•–—˜™š›œ\u009DžŸ';
const unassigned = /[\u0081\u008D\u008F\u0090\u009D]/;

/** Some versions of Node decode windows-1252 as Latin-1; the 32 characters that differ are set right here, which changes nothing elsewhere. */
function decodeWindows1252(bytes: Uint8Array): string | undefined {
  const text = new TextDecoder('windows-1252')
    .decode(bytes)
    .replace(/[\u0080-\u009F]/g, (c) => windows1252[c.charCodeAt(0) - 0x80] as string);
  return unassigned.test(text) ? undefined : text;
}

function decodeStrictly(bytes: Uint8Array, encoding: Encoding): string | undefined {
  if (encoding === 'windows-1252') return decodeWindows1252(bytes);
  try {
    return new TextDecoder(encoding, { fatal: true }).decode(bytes);
  } catch {
    return undefined;
  }
}

const spokenNames: Readonly<Record<Encoding, string>> = {
  'utf-8': 'UTF-8',
  'utf-16le': 'UTF-16 (little-endian)',
  'utf-16be': 'UTF-16 (big-endian)',
  'windows-1252': 'Windows-1252',
};

/**
 * Decodes a whole file. Without `declared` the encoding is found: byte order mark, UTF-16 by its zeros, valid UTF-8, else Windows-1252.
 * @param declared what a person says the encoding is; a file that does not fit it is a problem, never patched
 */
export function decodeBytes(bytes: Uint8Array, declared?: Encoding): DecodedText | DecodingProblem {
  if (bytes.length === 0) return { problem: 'empty-file', message: 'The file is empty.' };
  const kind = binaryKind(bytes);
  if (kind) return binary(kind);
  const marked = markOf(bytes);
  const encoding = declared ?? marked ?? utf16ByZeros(bytes);
  const wide = encoding === 'utf-16le' || encoding === 'utf-16be';
  if (!wide && (bytes.subarray(0, sampleBytes).includes(0) || looksBinary(bytes))) return binary('a binary file');

  if (encoding) {
    const text = decodeStrictly(bytes, encoding);
    if (text !== undefined) return finish(text, encoding);
    const says = declared ? 'was said to be' : 'begins like';
    return wrongEncoding(`The file ${says} ${spokenNames[encoding]}, but has bytes that are not.`);
  }
  const utf8 = decodeStrictly(bytes, 'utf-8');
  if (utf8 !== undefined) return finish(utf8, 'utf-8');
  const western = decodeWindows1252(bytes);
  if (western !== undefined) return finish(western, 'windows-1252');
  return wrongEncoding('The file is neither UTF-8 nor UTF-16 nor Windows-1252.');
}

function finish(text: string, encoding: Encoding): DecodedText | DecodingProblem {
  if (text.includes('\u0000')) return binary('a binary file');
  if (text.trim() === '') return { problem: 'empty-file', message: 'The file has nothing but blank space.' };
  return { text: text.startsWith('\uFEFF') ? text.slice(1) : text, encoding };
}
