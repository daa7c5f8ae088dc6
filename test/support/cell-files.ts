import { readFileSync, readdirSync } from 'node:fs';
import { join } from 'node:path';
import JSZip from 'jszip';
import type { ImportRequest } from '../../shared/contracts/library';
import { familyDescription, type FamilyDescription } from '../../shared/model/cell-family';

const LIBRARY = join(__dirname, '..', '..', 'cell-library');

export function descriptionOf(folder: string): FamilyDescription {
  return familyDescription.parse(JSON.parse(readFileSync(join(LIBRARY, folder, 'family.json'), 'utf8')));
}

/** The data files of a family of the project's own library, by name. */
export function cellFilesOf(folder: string): { name: string; bytes: Buffer }[] {
  const path = join(LIBRARY, folder);
  const names = readdirSync(path).filter((name) => !['family.json', 'README.md', 'faults.csv'].includes(name));
  return names.sort().map((name) => ({ name, bytes: readFileSync(join(path, name)) }));
}

export async function zipOf(files: readonly { name: string; bytes: Buffer }[]): Promise<Buffer> {
  const zip = new JSZip();
  for (const { name, bytes } of files) zip.file(name, bytes);
  return zip.generateAsync({ type: 'nodebuffer', compression: 'DEFLATE' });
}

/** A multipart form as the browser sends it. */
export function uploadForm(files: readonly { name: string; bytes: Buffer }[], fields: Readonly<Record<string, unknown>>): FormData {
  const form = new FormData();
  for (const [name, value] of Object.entries(fields)) form.append(name, typeof value === 'string' ? value : JSON.stringify(value));
  for (const { name, bytes } of files) form.append('files', new Blob([new Uint8Array(bytes)]), name);
  return form;
}

export const importOf = (folder: string, more: Partial<ImportRequest> = {}): ImportRequest => ({
  description: descriptionOf(folder),
  mapping: {},
  note: 'looked at on the screen',
  ...more,
});
