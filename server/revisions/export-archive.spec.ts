import { checksumList, fileNamePart, readArchive, sha256Of, zipArchive } from './export-archive';

const files = [
  { name: 'b.txt', function: 'second', content: 'Å' },
  { name: 'a.txt', function: 'first', content: '' },
];

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
    const read = await readArchive(await zipArchive('folder', files));
    expect(read.map(({ name, content }) => [name, content.toString('utf8')])).toEqual([['SHA256SUMS', checksumList(files)], ['a.txt', ''], ['b.txt', 'Å']]);
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
