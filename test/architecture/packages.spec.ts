import { existsSync, readFileSync, readdirSync } from 'node:fs';
import { join } from 'node:path';
import { projectFolder } from './source-tree';

interface LockedPackage {
  readonly version?: string;
  readonly license?: string;
  readonly integrity?: string;
  readonly dev?: boolean;
  readonly optional?: boolean;
}

interface Manifest {
  readonly dependencies: Record<string, string>;
  readonly devDependencies: Record<string, string>;
}

const read = <T>(file: string): T => JSON.parse(readFileSync(join(projectFolder, file), 'utf8')) as T;
const locked = Object.entries(read<{ packages: Record<string, LockedPackage> }>('package-lock.json').packages).filter(([path]) => path !== '');
const shipped = locked.filter(([, { dev }]) => !dev);

/** Licences that let the product be handed on with no more than their text beside it; one of a choice is enough. */
const permissive = ['MIT', 'MIT-0', 'ISC', 'BSD-2-Clause', 'BSD-3-Clause', '0BSD', 'Apache-2.0', 'OFL-1.1', 'Zlib', 'BlueOak-1.0.0'];

function isPermissive(licence: string): boolean {
  const terms = licence.replace(/[()]/g, '');
  return terms.includes(' OR ')
    ? terms.split(' OR ').some((term) => permissive.includes(term))
    : terms.split(' AND ').every((term) => permissive.includes(term));
}

/** Older packages name no licence in their manifest but carry its text. */
function carriesMitText(path: string): boolean {
  const folder = join(projectFolder, path);
  if (!existsSync(folder)) return false;
  const files = readdirSync(folder).filter((name) => /^(licen[cs]e|readme)/i.test(name));
  return files.some((name) => readFileSync(join(folder, name), 'utf8').includes('Permission is hereby granted, free of charge'));
}

describe('the packages', () => {
  it('ship under permissive licences', () => {
    const others = shipped.filter(([path, { license }]) => (license === undefined ? !carriesMitText(path) : !isPermissive(license)));
    expect(others.map(([path, { license }]) => `${path}: ${license ?? 'no licence found'}`)).toEqual([]);
  });

  it('are each pinned by the hash of their contents', () => {
    expect(locked.filter(([, { integrity }]) => !integrity).map(([path]) => path)).toEqual([]);
  });

  it('are asked for by exact version, the one in the lock', () => {
    const { dependencies, devDependencies } = read<Manifest>('package.json');
    const versions = new Map(locked.map(([path, { version }]) => [path, version]));
    const loose = Object.entries({ ...dependencies, ...devDependencies }).filter(([name, version]) => versions.get(`node_modules/${name}`) !== version);
    expect(loose).toEqual([]);
  });

  it('tell a choice of licences from a sum of them', () => {
    expect(['(MIT OR GPL-3.0-or-later)', '(MIT AND Zlib)', '(MIT AND GPL-3.0-only)', 'GPL-3.0-only'].map(isPermissive)).toEqual([true, true, false, false]);
  });
});
