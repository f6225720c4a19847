import { readFileSync } from 'node:fs';

export interface TextOfFile {
  /** What is not valid UTF-8 has become U+FFFD, which the reader of descriptions reports. */
  readonly text: string;
  /** False where writing the text back as UTF-8 would change more than was meant to. */
  readonly isUtf8: boolean;
}

/** UTF-8, or UTF-16 where a byte order mark says so, as YAML 1.2 (section 5.2) and spreadsheets have it. */
export function textOfFile(path: string): TextOfFile {
  const bytes = readFileSync(path);
  for (const [encoding, first, second] of [['utf-16le', 0xff, 0xfe], ['utf-16be', 0xfe, 0xff]] as const) {
    if (bytes[0] === first && bytes[1] === second) return { text: new TextDecoder(encoding).decode(bytes), isUtf8: false };
  }
  const text = bytes.toString('utf8');
  return { text, isUtf8: bytes.equals(Buffer.from(text, 'utf8')) };
}
