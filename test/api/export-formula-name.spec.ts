import { execFile } from 'node:child_process';
import { mkdirSync, mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { promisify } from 'node:util';
import JSZip from 'jszip';
import type { PanelDetail } from '../../shared/contracts/projects';
import { Api } from '../support/api';
import { bodyOf, freeze, newProject } from '../support/panels';

const run = promisify(execFile);
const PROJECT = '=HYPERLINK(1)';
const FOLDER = 'HYPERLINK-1_cmd-calc_r1';

/** With the machine's own program; where there is none, entry by entry. */
async function unpack(bytes: Buffer, folder: string): Promise<void> {
  writeFileSync(join(folder, 'export.zip'), bytes);
  try {
    await run('unzip', ['-q', 'export.zip'], { cwd: folder });
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code !== 'ENOENT') throw error;
    mkdirSync(join(folder, FOLDER));
    for (const entry of Object.values((await JSZip.loadAsync(bytes)).files)) writeFileSync(join(folder, entry.name), await entry.async('nodebuffer'));
  }
}

describe('the export of a project and a panel named as formulas', () => {
  let api: Api;
  let folder: string;
  let bytes: Buffer;

  beforeAll(async () => {
    api = await Api.start();
    const designer = await api.signedIn('designer');
    const project = await newProject(designer, PROJECT);
    const panel = bodyOf<PanelDetail>(await designer.post(`/api/projects/${project.id}/panels`, { name: '@cmd|calc' }), 201);
    const revision = await freeze(designer, panel.id, '+1+1');
    bytes = (await designer.get(`/api/revisions/${revision.id}/export`)).bytes;
    folder = mkdtempSync(join(tmpdir(), 'slantwise-export-'));
    await unpack(bytes, folder);
  }, 60_000);
  afterAll(async () => {
    rmSync(folder, { recursive: true, force: true });
    await api.close();
  });

  it('has names of plain letters only, in one folder', async () => {
    const names = Object.keys((await JSZip.loadAsync(bytes)).files);
    expect(names).toHaveLength(8);
    for (const name of names) expect(name).toMatch(/^HYPERLINK-1_cmd-calc_r1\/[A-Za-z0-9._-]+$/);
  });

  it('unpacks into files that sha256sum accepts', async () => {
    const { stdout } = await run('sha256sum', ['--strict', '-c', 'SHA256SUMS'], { cwd: join(folder, FOLDER) });
    expect(stdout.trim().split('\n')).toHaveLength(readdirSync(join(folder, FOLDER)).length - 1);
    expect(stdout).not.toContain('FAILED');
  });

  it('holds no table in which a spreadsheet would run a formula', async () => {
    const zip = await JSZip.loadAsync(bytes);
    const tables = Object.values(zip.files).filter(({ name }) => name.endsWith('.csv'));
    expect(tables).toHaveLength(4);
    for (const table of tables) {
      const cells = (await table.async('string')).split(/\r\n|,/);
      expect(cells.filter((cell) => /^"?[=+@\t]/.test(cell) || /^"?-(?![\d.])/.test(cell))).toEqual([]);
    }
  });

  it('keeps the names as they are where they are text', () => {
    const read = (name: string): string => readFileSync(join(folder, FOLDER, name), 'utf8');
    expect(JSON.parse(read('manifest.json'))).toMatchObject({ project: { name: PROJECT }, panel: { name: '@cmd|calc' }, revision: { message: '+1+1' } });
    expect(read('README.txt')).toContain('=HYPERLINK(1): @cmd|calc, revision 1');
  });
});
