/** From bytes to text: finds the encoding, and refuses what is no text. */

import type { TableEncoding } from '../names';
import { InputProblem } from '../problem';
import type { TableWarning } from './reading';

/** Largest table read, bytes: just below the longest string the runtimes can hold. */
const MAX_TABLE_BYTES = 512_000_000;

export interface DecodedText {
  text: string;
  encoding: TableEncoding;
  warnings: TableWarning[];
}

/**
 * A byte-order mark decides, then valid UTF-8; everything else is Windows-1252, with a remark.
 * @throws InputProblem when the bytes are none, too many, or no text.
 */
export function decodeTable(
  bytes: Uint8Array,
  wanted: TableEncoding | undefined,
  file?: string,
): DecodedText {
  if (bytes.length === 0) throw new InputProblem('the file is empty; a table of numbers is needed', { file });
  if (bytes.length > MAX_TABLE_BYTES)
    throw new InputProblem(
      `the table has ${bytes.length} bytes; at most ${MAX_TABLE_BYTES} are read: cut it, or leave out columns`,
      { file },
    );
  const encoding = wanted ?? markedEncoding(bytes);
  if (encoding === undefined || encoding === 'utf-8' || encoding === 'windows-1252') refuseNul(bytes, file);
  const decoded = encoding ? decodeAs(bytes, encoding, file) : decodeUnmarked(bytes);
  refuseControlSigns(decoded.text, file);
  return decoded;
}

function markedEncoding(bytes: Uint8Array): TableEncoding | undefined {
  if (bytes[0] === 0xff && bytes[1] === 0xfe) return 'utf-16le';
  if (bytes[0] === 0xfe && bytes[1] === 0xff) return 'utf-16be';
  if (bytes[0] === 0xef && bytes[1] === 0xbb && bytes[2] === 0xbf) return 'utf-8';
  return undefined;
}

function decodeUnmarked(bytes: Uint8Array): DecodedText {
  try {
    return {
      text: new TextDecoder('utf-8', { fatal: true }).decode(bytes),
      encoding: 'utf-8',
      warnings: [],
    };
  } catch {
    return {
      text: new TextDecoder('windows-1252').decode(bytes),
      encoding: 'windows-1252',
      warnings: [
        { code: 'table-encoding', message: 'the text is not valid UTF-8 and was read as Windows-1252' },
      ],
    };
  }
}

function decodeAs(bytes: Uint8Array, encoding: TableEncoding, file?: string): DecodedText {
  try {
    return { text: new TextDecoder(encoding, { fatal: true }).decode(bytes), encoding, warnings: [] };
  } catch {
    throw new InputProblem(`the text is not valid ${encoding}; state another encoding`, { file });
  }
}

function refuseNul(bytes: Uint8Array, file?: string): void {
  const at = bytes.indexOf(0);
  if (at < 0) return;
  const start = bytes.subarray(0, 4000);
  const everySecond = start.filter((byte) => byte === 0).length > start.length * 0.4;
  throw new InputProblem(
    everySecond
      ? 'every second byte is zero: not a text table, unless its encoding is stated as utf-16le or utf-16be'
      : `not a text table: byte ${at + 1} is zero`,
    { file },
  );
}

/** Looks at the beginning only: binary data show themselves there. */
function refuseControlSigns(text: string, file?: string): void {
  let line = 1;
  const end = Math.min(text.length, 65_536);
  for (let i = 0; i < end; i++) {
    const code = text.charCodeAt(i);
    if (code === 10 || (code === 13 && text.charCodeAt(i + 1) !== 10)) line++;
    const allowed = code >= 32 || (code >= 9 && code <= 13) || code === END_OF_FILE;
    if (!allowed) throw new InputProblem(`not a text table: control sign ${code} found`, { file, line });
  }
}

/** Old programs end a text with this sign. */
export const END_OF_FILE = 26;
