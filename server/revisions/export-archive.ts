import { createHash } from 'node:crypto';
import JSZip from 'jszip';

/** A file with its bytes and their hash, made once however often they are asked for. */
export interface ArchivedFile {
  /** Within the folder of the archive; letters, digits, dots, dashes and underscores only. */
  readonly name: string;
  /** What the file is for, in one line. */
  readonly function: string;
  readonly bytes: Buffer;
  readonly sha256: string;
}

export function archivedFile(name: string, purpose: string, content: string | Buffer): ArchivedFile {
  const bytes = typeof content === 'string' ? Buffer.from(content, 'utf8') : content;
  return { name, function: purpose, bytes, sha256: sha256Of(bytes) };
}

export interface Archive {
  /** Without `.zip`; the archive holds one folder of this name. */
  readonly name: string;
  readonly bytes: Buffer;
  readonly sha256: string;
}

export const CHECKSUM_FILE = 'SHA256SUMS';
// The oldest time a zip can hold. Times of the work itself stand in the manifest, so that equal content gives equal bytes.
const FIXED_TIME = new Date(Date.UTC(1980, 0, 1));
// The highest level takes three times as long for a million cells and saves a seventh.
const LEVEL = 2;

export const sha256Of = (bytes: string | Uint8Array): string => createHash('sha256').update(bytes).digest('hex');

/** The list that `sha256sum --strict -c` checks, in the order of the names. */
export function checksumList(files: readonly ArchivedFile[]): string {
  return inOrder(files)
    .map(({ name, sha256 }) => `${sha256}  ${name}\n`)
    .join('');
}

/** The files of an archive in their order, the list of their checksums among them. */
export function withChecksums(files: readonly ArchivedFile[]): ArchivedFile[] {
  return inOrder([...files, archivedFile(CHECKSUM_FILE, 'checksums of the other files', checksumList(files))]);
}

/** The same files give the same bytes: fixed order, time, attributes and compression. */
export async function zipArchive(name: string, files: readonly ArchivedFile[]): Promise<Archive> {
  const zip = new JSZip();
  for (const file of withChecksums(files)) {
    zip.file(`${name}/${file.name}`, file.bytes, { date: FIXED_TIME, createFolders: false });
  }
  const bytes = await zip.generateAsync({ type: 'nodebuffer', platform: 'DOS', compression: 'DEFLATE', compressionOptions: { level: LEVEL } });
  return { name, bytes, sha256: sha256Of(bytes) };
}

/** By the code units of their names, whatever the language of the machine. */
const inOrder = (files: readonly ArchivedFile[]): ArchivedFile[] => [...files].sort((a, b) => (a.name < b.name ? -1 : 1));

/** A name as part of a file name: what is no letter, digit or dot becomes a dash. */
export function fileNamePart(text: string, otherwise: string): string {
  const plain = text
    .normalize('NFKD')
    .replace(/\p{M}/gu, '')
    .replace(/[^A-Za-z0-9.]+/g, '-')
    .slice(0, 60)
    .replace(/^[-.]+|[-.]+$/g, '');
  return plain === '' ? otherwise : plain;
}
