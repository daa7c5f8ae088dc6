import JSZip from 'jszip';
import { InvalidInput } from '../http/problems';
import type { NamedBytes } from './upload-archive';
import { unpackUpload } from './upload-archive';

const text = (value: string): Uint8Array => new TextEncoder().encode(value);

async function zipOf(entries: Record<string, string | Uint8Array>): Promise<NamedBytes> {
  const zip = new JSZip();
  for (const [name, body] of Object.entries(entries)) zip.file(name, body, { createFolders: false });
  return { name: 'family.zip', bytes: await zip.generateAsync({ type: 'uint8array', compression: 'DEFLATE' }) };
}

async function faultsOf(files: readonly NamedBytes[]): Promise<string[]> {
  try {
    await unpackUpload(files);
  } catch (error) {
    if (error instanceof InvalidInput) return error.faults.map((fault) => fault.detail);
    throw error;
  }
  return [];
}

describe('an upload', () => {
  it('keeps single files as they are and unpacks a zip beside them', async () => {
    const zip = await zipOf({ 'cells/a.s1p': 'one', 'cells/b.s1p': 'two', '__MACOSX/a': 'junk' });
    const files = await unpackUpload([{ name: 'c.s1p', bytes: text('three') }, zip]);
    expect(files.map((file) => [file.name, new TextDecoder().decode(file.bytes)])).toEqual([['c.s1p', 'three'], ['a.s1p', 'one'], ['b.s1p', 'two']]);
  });

  it('names an entry that leads outside the archive', async () => {
    const zip = await zipOf({ 'ok.s1p': 'x', 'win\\..\\..\\c.txt': 'x' });
    expect(await faultsOf([zip])).toEqual([expect.stringContaining('leads outside the archive')]);
  });

  it('refuses an archive inside the archive', async () => {
    expect(await faultsOf([await zipOf({ 'inner.zip': 'x' })])).toEqual([expect.stringContaining('archive inside the archive')]);
  });

  it('stops a bomb at the ratio limit, whatever sizes it declares', async () => {
    const zip = await zipOf({ 'zeros.s1p': new Uint8Array(7 * 1024 * 1024) });
    expect(await faultsOf([zip])).toEqual([expect.stringContaining('100 times its size')]);
  });

  it('refuses a zip whose content does not match its checksum', async () => {
    const zip = new JSZip();
    zip.file('a.s1p', 'the stored text of a cell');
    const bytes = await zip.generateAsync({ type: 'uint8array', compression: 'STORE' });
    const at = Buffer.from(bytes).indexOf('stored');
    bytes[at] = 0x58;
    expect(await faultsOf([{ name: 'damaged.zip', bytes }])).toEqual([expect.stringContaining('cannot be read')]);
  });

  it('refuses a zip that is cut off', async () => {
    const zip = await zipOf({ 'a.s1p': 'x'.repeat(1000) });
    expect(await faultsOf([{ name: 'cut.zip', bytes: zip.bytes.slice(0, 60) }])).toEqual([expect.stringContaining('cannot be read')]);
  });

  it('names files that come twice, also when only their case differs', async () => {
    const files = [{ name: 'A.s1p', bytes: text('1') }, { name: 'a.S1P', bytes: text('2') }];
    expect(await faultsOf(files)).toEqual([expect.stringContaining('more than once')]);
  });
});
