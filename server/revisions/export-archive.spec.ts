import JSZip from 'jszip';
import { archivedFile, checksumList, fileNamePart, sha256Of, withChecksums, zipArchive } from './export-archive';

const files = [archivedFile('b.txt', 'second', 'Å'), archivedFile('a.txt', 'first', '')];

describe('an archive', () => {
  it('lists checksums as sha256sum writes them, in the order of the names', () => {
    // The first is the SHA-256 of nothing.
    expect(checksumList(files)).toBe(
      `e3b0c44298fc1c149afbf4c8996fb92427ae41e4649b934ca495991b7852b855  a.txt\n${sha256Of(Buffer.from('Å', 'utf8'))}  b.txt\n`,
    );
  });

  it('has the same bytes whenever and in whatever order it is made', async () => {
    const first = await zipArchive('folder', files);
    jest.useFakeTimers({ now: new Date('2031-05-06T07:08:09Z'), doNotFake: ['setImmediate', 'nextTick', 'setTimeout', 'queueMicrotask'] });
    const second = await zipArchive('folder', [...files].reverse());
    jest.useRealTimers();
    expect(second.bytes.equals(first.bytes)).toBe(true);
  });

  it('gives its files back, checksums among them', async () => {
    const { name, bytes, sha256 } = await zipArchive('folder', files);
    expect([name, sha256]).toEqual(['folder', sha256Of(bytes)]);
    const entries = Object.values((await JSZip.loadAsync(bytes, { checkCRC32: true })).files);
    const read = await Promise.all(entries.map(async (entry) => [entry.name, await entry.async('string')]));
    expect(read).toEqual([['folder/SHA256SUMS', checksumList(files)], ['folder/a.txt', ''], ['folder/b.txt', 'Å']]);
    expect(withChecksums(files).map((file) => [`folder/${file.name}`, file.bytes.toString('utf8')])).toEqual(read);
  });
});

describe('fileNamePart', () => {
  it.each([
    ['Merrow Point sea-rescue link', 'Merrow-Point-sea-rescue-link'],
    ['../../etc/passwd', 'etc-passwd'],
    ['Ångström\u202E"; rm -rf', 'Angstrom-rm-rf'],
    ['..', 'panel'],
    ['漢字', 'panel'],
    ['x'.repeat(200), 'x'.repeat(60)],
    ['a.b', 'a.b'],
  ])('makes of %j the part %j', (text, part) => {
    expect(fileNamePart(text, 'panel')).toBe(part);
  });
});
