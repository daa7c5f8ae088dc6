import JSZip from 'jszip';
import { InvalidInput } from '../http/problems';

/** What one upload may hold once unpacked. Checked while unpacking: the sizes a zip declares are not believed. */
export const ARCHIVE_LIMITS = {
  entries: 2_000,
  entryBytes: 8 * 1024 * 1024,
  totalBytes: 64 * 1024 * 1024,
  /** Deflate cannot pass about 1032:1; text tables stay below 30:1. */
  ratio: 100,
} as const;

export interface NamedBytes {
  readonly name: string;
  readonly bytes: Uint8Array;
}

const ZIP_SIGNATURE = [0x50, 0x4b];
const END_OF_DIRECTORY = 0x06054b50;
const JUNK = /(^|\/)(__MACOSX\/|\.DS_Store$|Thumbs\.db$)/;

/** The files of an upload, zips unpacked one level deep. Throws InvalidInput naming every entry that is refused. */
export async function unpackUpload(files: readonly NamedBytes[]): Promise<NamedBytes[]> {
  const unpacked: NamedBytes[] = [];
  for (const file of files) {
    if (isZip(file.bytes)) unpacked.push(...(await unpackZip(file)));
    else unpacked.push(file);
  }
  refuseDuplicates(unpacked);
  return unpacked;
}

function isZip(bytes: Uint8Array): boolean {
  return ZIP_SIGNATURE.every((value, i) => bytes[i] === value);
}

async function unpackZip(archive: NamedBytes): Promise<NamedBytes[]> {
  const zip = await openZip(archive);
  const entries = Object.values(zip.files).filter((entry) => !entry.dir && !JUNK.test(entry.name));
  const faults = entries.map(entryFault).filter((fault) => fault !== null);
  const declared = declaredEntryCount(archive.bytes);
  if (declared !== Object.keys(zip.files).length) faults.push('it names the same entry more than once');
  if (entries.length > ARCHIVE_LIMITS.entries) faults.push(`it holds ${entries.length} files; at most ${ARCHIVE_LIMITS.entries} are read`);
  if (faults.length > 0) throw new InvalidInput(faults.map((fault) => ({ pointer: '#/files', detail: `${archive.name}: ${fault}` })));
  const budget = { left: Math.min(ARCHIVE_LIMITS.totalBytes, archive.bytes.length * ARCHIVE_LIMITS.ratio) };
  const read: NamedBytes[] = [];
  for (const entry of entries) read.push({ name: baseName(entry.name), bytes: await inflate(archive.name, entry, budget) });
  await checkSums(archive);
  return read;
}

async function openZip(archive: NamedBytes): Promise<JSZip> {
  try {
    return await JSZip.loadAsync(archive.bytes);
  } catch (cause) {
    throw unreadable(archive.name, cause);
  }
}

/** Every size is within its limit by now, so the whole archive may be inflated once more to compare its checksums. */
async function checkSums(archive: NamedBytes): Promise<void> {
  try {
    await JSZip.loadAsync(archive.bytes, { checkCRC32: true });
  } catch (cause) {
    throw unreadable(archive.name, cause);
  }
}

function unreadable(name: string, cause: unknown): InvalidInput {
  const reason = cause instanceof Error ? cause.message.split('\n')[0] : 'unknown reason';
  return new InvalidInput([{ pointer: '#/files', detail: `${name}: the zip cannot be read (${reason}); send it again, or send the files singly` }]);
}

function entryFault(entry: JSZip.JSZipObject): string | null {
  const name = entry.unsafeOriginalName ?? entry.name;
  if (/(^|[\\/])\.\.([\\/]|$)|^[\\/]|^[A-Za-z]:|\\|\0/.test(name)) return `the entry ${JSON.stringify(name)} leads outside the archive`;
  const mode = typeof entry.unixPermissions === 'number' ? entry.unixPermissions : 0;
  if ((mode & 0o170000) === 0o120000) return `the entry ${JSON.stringify(name)} is a symbolic link`;
  if (/\.(zip|7z|rar|tar|t?gz)$/i.test(name)) return `the entry ${JSON.stringify(name)} is an archive inside the archive`;
  return null;
}

function inflate(archiveName: string, entry: JSZip.JSZipObject, budget: { left: number }): Promise<Uint8Array> {
  return new Promise((resolve, reject) => {
    const chunks: Buffer[] = [];
    let bytes = 0;
    const stream = entry.nodeStream();
    const stop = (detail: string) => {
      stream.pause();
      stream.removeAllListeners('data');
      reject(new InvalidInput([{ pointer: '#/files', detail: `${archiveName}: ${detail}` }]));
    };
    stream.on('data', (chunk: Buffer) => {
      bytes += chunk.length;
      budget.left -= chunk.length;
      if (bytes > ARCHIVE_LIMITS.entryBytes) stop(`${entry.name} is larger than ${ARCHIVE_LIMITS.entryBytes} bytes`);
      else if (budget.left < 0) stop(`it unpacks to more than ${ARCHIVE_LIMITS.totalBytes} bytes or more than ${ARCHIVE_LIMITS.ratio} times its size`);
      else chunks.push(chunk);
    });
    stream.on('error', (cause: Error) => reject(unreadable(archiveName, cause)));
    stream.on('end', () => resolve(new Uint8Array(Buffer.concat(chunks))));
  });
}

/** Entries that the end record of the directory announces (zip application note, section 4.3.16). */
function declaredEntryCount(bytes: Uint8Array): number {
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  for (let at = bytes.length - 22; at >= 0; at -= 1) {
    if (view.getUint32(at, true) === END_OF_DIRECTORY) return view.getUint16(at + 10, true);
  }
  return -1;
}

function baseName(path: string): string {
  return path.slice(path.lastIndexOf('/') + 1);
}

function refuseDuplicates(files: readonly NamedBytes[]): void {
  const seen = new Set<string>();
  const twice = new Set<string>();
  for (const { name } of files) {
    const key = name.toLowerCase();
    if (seen.has(key)) twice.add(name);
    seen.add(key);
  }
  if (twice.size === 0) return;
  throw new InvalidInput([...twice].map((name) => ({ pointer: '#/files', detail: `${name} comes more than once; keep one, or rename` })));
}
