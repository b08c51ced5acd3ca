import type { Finding } from '../shared/index.ts';
import type { Problems } from './problems.ts';

/** A year in any of these formats is 1 to 4 MB; a small gzip file may hold a thousand times its size. */
const LARGEST_BYTES = 64e6;
const GZIP_MAGIC = [0x1f, 0x8b];

/**
 * The lines of a weather file from its bytes: gunzipped where they begin with the gzip magic number (RFC 1952),
 * decoded as UTF-8 or else as Windows-1252 (with a note), without byte order mark and line ends of any kind.
 */
export const linesOf = async (bytes: Uint8Array, problems: Problems, notes: Finding[]): Promise<string[]> => {
  const zipped = GZIP_MAGIC.every((byte, i) => bytes[i] === byte);
  const text = decode(zipped ? await gunzip(bytes, problems) : bytes, notes);
  if (text.trim() === '')
    problems.fail({
      code: 'empty-file',
      expected: 'an hourly weather file',
      found: 'an empty file',
      fix: 'Check that the download or copy was complete.',
    });
  if (isBinary(text))
    problems.fail({
      code: 'binary-file',
      expected: 'a text file in EPW, TMY2 or TMY3 format or a plain table',
      found: 'binary data',
      fix: 'Export the year as text; of compressed files only .gz is read as it is.',
    });
  return text.split(/\r\n|\n|\r/);
};

/** Control characters, tab, line ends and form feed aside, are in none of the text formats; a binary file soon has one. */
const isBinary = (text: string): boolean => {
  const end = Math.min(text.length, 65_536);
  for (let i = 0; i < end; i++) {
    const code = text.charCodeAt(i);
    if (code < 9 || (code > 13 && code < 32)) return true;
  }
  return false;
};

/** The decoder drops a byte order mark by itself. */
const decode = (bytes: Uint8Array, notes: Finding[]): string => {
  try {
    return new TextDecoder('utf-8', { fatal: true }).decode(bytes);
  } catch {
    notes.push({
      code: 'encoding',
      severity: 'note',
      text: 'The file is not UTF-8; it was read as Windows-1252.',
      fix: 'Check the letters of the station name.',
    });
    return new TextDecoder('windows-1252').decode(bytes);
  }
};

const tooLarge = (problems: Problems): never =>
  problems.fail({
    code: 'too-large',
    expected: `one year, which is under ${LARGEST_BYTES / 1e6} MB when unpacked`,
    found: 'more',
    fix: 'Check that it is a weather file.',
  });

const gunzip = async (bytes: Uint8Array, problems: Problems): Promise<Uint8Array> => {
  const stream = new DecompressionStream('gzip');
  const writer = stream.writable.getWriter();
  // A fault of the data surfaces at the reading end too; here it would be an unhandled rejection.
  writer.write(bytes as Uint8Array<ArrayBuffer>).catch(() => {});
  writer.close().catch(() => {});
  try {
    const chunks: Uint8Array[] = [];
    let length = 0;
    for await (const chunk of stream.readable as AsyncIterable<Uint8Array>) {
      chunks.push(chunk);
      length += chunk.length;
      if (length > LARGEST_BYTES) break;
    }
    if (length > LARGEST_BYTES) return tooLarge(problems);
    const whole = new Uint8Array(length);
    let at = 0;
    for (const chunk of chunks) {
      whole.set(chunk, at);
      at += chunk.length;
    }
    return whole;
  } catch (cause) {
    if (problems.any) throw cause;
    return problems.fail(
      {
        code: 'corrupt-gzip',
        expected: 'a whole gzip file',
        found: 'compressed data that is damaged or cut short',
        fix: 'Download it again, or unpack it and name the unpacked file.',
      },
      { cause },
    );
  }
};
