import { basename } from 'node:path';
import { lineCount, percentile, sourceFiles } from './source-tree';
import type { SourceFile } from './source-tree';

const isCode = ({ path }: SourceFile): boolean => /^(src|server|shared)\//.test(path) && !path.endsWith('.spec.ts');
const linesOf = ({ path, text }: SourceFile): string => `${path} (${lineCount(text)} lines)`;
const over = (limit: number) => (file: SourceFile): boolean => lineCount(file.text) > limit;

describe('the size of files', () => {
  const typescript = sourceFiles(/\.ts$/);
  const code = typescript.filter(isCode);
  const sizes = code.map(({ text }) => lineCount(text));

  it('keeps every file of code, template and style within 400 lines', () => {
    const files = sourceFiles(/\.(ts|mjs|cjs|html|scss)$/).filter(({ path }) => !path.endsWith('.spec.ts') && !path.startsWith('test/'));
    expect(files.filter(over(400)).map(linesOf)).toEqual([]);
  });

  it('keeps every test within 500 lines', () => {
    expect(typescript.filter(({ path }) => !isCode({ path, text: '' })).filter(over(500)).map(linesOf)).toEqual([]);
  });

  it('keeps 95 of 100 files of code within 250 lines', () => {
    expect(percentile(sizes, 0.95)).toBeLessThanOrEqual(250);
  });

  it('keeps half of the files of code within 90 lines', () => {
    expect(percentile(sizes, 0.5)).toBeLessThanOrEqual(90);
  });

  it('ranks by the nearest-rank rule', () => {
    expect([percentile([1, 2, 3, 4], 0.5), percentile([5, 1, 3], 0.95), percentile([7], 0.5)]).toEqual([2, 5, 7]);
  });
});

describe('the names of files', () => {
  const code = sourceFiles(/\.(ts|html|scss)$/).filter(({ path }) => /^(src|server|shared|test)\//.test(path));
  const names = code.map(({ path }) => path);

  /** Shapes that every contract shares: ids, pages, problems. The list only shrinks. */
  const permitted = ['shared/contracts/common.ts'];

  it('says what a file is about: no catch-all names, for files or folders', () => {
    const catchAll = /(^|[/-])(utils?|helpers?|commons?|misc)([/.]|$)/;
    expect(names.filter((path) => catchAll.test(path) && !permitted.includes(path))).toEqual([]);
  });

  it('has no barrels', () => {
    expect(names.filter((path) => basename(path) === 'index.ts')).toEqual([]);
  });

  it('writes file names in kebab-case', () => {
    expect(names.filter((path) => !/^_?[a-z0-9]+(-[a-z0-9]+)*(\.[a-z0-9]+)*$/.test(basename(path)))).toEqual([]);
  });
});

describe('the words in the tree', () => {
  const everything = sourceFiles(/(\.(ts|mjs|cjs|html|scss|css|md|json|yml|svg)|\.ci\/run)$/).filter(({ path }) => path !== 'package-lock.json');
  const outsideHere = everything.filter(({ path }) => !path.startsWith('test/architecture/'));

  const find = (files: readonly SourceFile[], pattern: RegExp): string[] =>
    files.flatMap(({ path, text }) => text.split('\n').flatMap((line, index) => (pattern.test(line) ? [`${path}:${index + 1}: ${line.trim().slice(0, 120)}`] : [])));

  it('leaves no note of work still to do', () => {
    expect(find(outsideHere, /\b(TODO|FIXME|XXX|HACK)\b/)).toEqual([]);
  });

  it('names no folder of one particular machine', () => {
    expect(find(outsideHere, /(^|[\s"'`(=:])\/(work|home|Users|mnt)\/[A-Za-z.]/)).toEqual([]);
  });

  it('leaves out no test and runs none alone', () => {
    const specs = outsideHere.filter(({ path }) => path.endsWith('.spec.ts'));
    expect(find(specs, /\b(describe|it|test)\.(skip|only)\b|\b(xit|xdescribe|fit|fdescribe)\(/)).toEqual([]);
    // Published checks of parts that are not built are listed with what each waits for; nothing else may wait.
    const others = specs.filter(({ path }) => path !== 'test/reference/published-checks.spec.ts');
    expect(find(others, /\b(describe|it|test)\.todo\b/)).toEqual([]);
  });

  it('silences neither compiler nor linter', () => {
    expect(find(outsideHere, /@ts-(ignore|expect-error|nocheck)|eslint-disable|stylelint-disable/)).toEqual([]);
  });
});
