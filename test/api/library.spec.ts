import { createHash, randomUUID } from 'node:crypto';
import { readBinaryBlock } from '../../shared/contracts/binary-block';
import type { EditionDetail, FamilySummary, Inspection, KeptFile } from '../../shared/contracts/library';
import { Api, STRANGER } from '../support/api';
import type { ApiClient, Answer } from '../support/api-client';
import { cellFilesOf, descriptionOf, importOf, uploadForm, zipOf } from '../support/cell-files';
import { expectInvalid, expectNotAllowed, expectNotFound, expectNotSignedIn, expectProblem, problemOf } from '../support/problems';

const FOUR = 'four-state-5';

describe('cell library', () => {
  let api: Api;
  let lab: ApiClient;
  let designer: ApiClient;
  beforeAll(async () => {
    api = await Api.start();
    lab = await api.signedIn('lab');
    designer = await api.signedIn('designer');
  }, 60_000);
  afterAll(() => api.close());

  const send = (client: ApiClient, path: string, form: FormData): Promise<Answer> => client.send('POST', path, { form });
  const inspect = (form: FormData): Promise<Answer> => send(lab, '/api/library/inspections', form);
  /** A family of its own for a test, with a name of its own. */
  const accepted = async (name = `Four states ${randomUUID().slice(0, 8)}`): Promise<EditionDetail> => {
    const request = importOf(FOUR, { description: { ...descriptionOf(FOUR), name } });
    const answer = await send(lab, '/api/library/families', uploadForm(cellFilesOf(FOUR), { import: request }));
    expect(answer.status).toBe(201);
    return answer.json as EditionDetail;
  };
  const published = async (): Promise<EditionDetail> => {
    const edition = await accepted();
    return (await lab.post(`/api/library/editions/${edition.id}/publication`, { note: 'for use' })).json as EditionDetail;
  };

  it('reads files without storing anything', async () => {
    const answer = await inspect(uploadForm(cellFilesOf(FOUR), {}));
    expect(answer.status).toBe(200);
    const inspection = answer.json as Inspection;
    expect(inspection.detected).toMatchObject({ cellCount: 4, portCount: 1, frequencyCount: 41, frequencyRangeGHz: { from: 24, to: 32 }, thetasDeg: [0] });
    expect(inspection.preview?.cells).toHaveLength(4);
    expect(inspection.acceptable).toBe(false);
    expect(await api.query('SELECT 1 FROM kept_file')).toEqual([]);
  });

  it('judges the cells once the description is complete', async () => {
    const answer = await inspect(uploadForm(cellFilesOf(FOUR), { inspection: { description: descriptionOf(FOUR) } }));
    const inspection = answer.json as Inspection;
    expect(inspection.acceptable).toBe(true);
    expect(inspection.quality?.cells).toHaveLength(4);
    expect(inspection.refusals).toEqual([]);
  });

  it('reads 450 files that come as one zip', async () => {
    const files = cellFilesOf('square-patch-5-oblique');
    const zip = await zipOf(files);
    const answer = await inspect(uploadForm([{ name: 'patches.zip', bytes: zip }], { inspection: { description: descriptionOf('square-patch-5-oblique') } }));
    const inspection = answer.json as Inspection;
    expect(inspection.detected).toMatchObject({ cellCount: 30, portCount: 2, thetasDeg: [0, 15, 30, 45, 60], phisDeg: [0, 22.5, 45] });
    expect(inspection.acceptable).toBe(true);
    expect(inspection.quality?.verdict).not.toBe('fail');
  }, 60_000);

  it('catches each injected fault of the laboratory-like set by the check it belongs to', async () => {
    const folder = 'square-patch-15-laboratory';
    const answer = await inspect(uploadForm(cellFilesOf(folder), { inspection: { description: descriptionOf(folder) } }));
    const { quality } = answer.json as Inspection;
    const failing = (check: string): string[] =>
      (quality?.cells ?? []).filter((cell) => cell.findings.some((finding) => finding.check === check && finding.verdict === 'fail')).map(({ cellId }) => cellId);
    expect(failing('passivity')).toEqual([expect.stringContaining('06.50')]);
    expect(failing('phase-jump')).toEqual([expect.stringContaining('08.20')]);
    expect(quality?.cells.find(({ cellId }) => cellId.includes('09.20'))?.findings.map(({ check }) => check)).toContain('missing-points');
    const jump = quality?.cells.flatMap(({ findings }) => findings).find(({ check, verdict }) => check === 'phase-jump' && verdict === 'fail');
    expect(jump).toMatchObject({ file: expect.stringContaining('08.20'), line: expect.any(Number) });
    const at = / at ([\d.]+) GHz/.exec(jump?.detail ?? '')?.[1];
    const text = cellFilesOf(folder).find(({ name }) => name === jump?.file)?.bytes.toString();
    expect(Number(text?.split('\n')[(jump?.line ?? 0) - 1].trim().split(/\s+/)[0])).toBeCloseTo(Number(at), 3);
  });

  it('compares a cell that was measured again with its first measurement, and keeps it out of the table', async () => {
    const files = cellFilesOf(FOUR);
    const first = files.find(({ name }) => name.endsWith('.s1p'));
    if (first === undefined) throw new Error('the family has no network file');
    const others = files.filter(({ name }) => !/index\.csv$/.test(name));
    const again = { name: 'again.s1p', bytes: first.bytes };
    const corrections = [{ file: again.name, cellId: first.name.replace(/\.s1p$/, '') }];
    const form = (mapping: object): FormData =>
      uploadForm([...others, again], { inspection: { mapping: { corrections, ...mapping }, description: descriptionOf(FOUR) } });
    const refused = (await inspect(form({}))).json as Inspection;
    expect([refused.acceptable, refused.messages.some(({ text }) => text.includes('both describe'))]).toEqual([false, true]);
    const { acceptable, quality, detected } = (await inspect(form({ repeatFiles: [again.name] }))).json as Inspection;
    expect([acceptable, detected.cellCount]).toEqual([true, 4]);
    const findings = quality?.cells.flatMap((cell) => cell.findings).filter(({ check }) => check === 'repeatability');
    expect(findings).toEqual([expect.objectContaining({ verdict: 'pass', file: again.name, detail: expect.stringContaining('over 41 responses') })]);
  });

  it('names every fault of a mapping at once, and unknown fields too', async () => {
    const mapping = { repeatFiles: [''], timeConvention: 'exp(jwt)', corrections: [{ file: 'a.s1p', thetaDeg: 91 }], repeats: true };
    const answer = await inspect(uploadForm(cellFilesOf(FOUR), { inspection: { mapping } }));
    expectInvalid(answer, [
      { pointer: '#/inspection/mapping/repeatFiles/0', detail: 'must have at least 1 characters' },
      { pointer: '#/inspection/mapping/corrections/0/thetaDeg', detail: 'must be at most 90; got 91' },
      { pointer: '#/inspection/mapping/timeConvention', detail: 'must be one of exp(+jwt), exp(-jwt); got "exp(jwt)"' },
      { pointer: '#/inspection/mapping/repeats', detail: 'is not a known field' },
    ]);
  });

  it('refuses a publication without a note, and searches that are none', async () => {
    const edition = await accepted();
    expectInvalid(await lab.post(`/api/library/editions/${edition.id}/publication`, { note: '  ' }), [{ pointer: '#/note', detail: 'must have at least 1 characters' }]);
    expectInvalid(await lab.post('/api/library/editions/7/publication', {}), [{ pointer: 'id', detail: 'must be an id' }, { pointer: '#/note', detail: 'is missing' }]);
    expectInvalid(await designer.get('/api/library/families?frequencyGHz=high&thetaDeg=91&colour=red'), [
      { pointer: 'frequencyGHz', detail: 'must be a finite number; got NaN' },
      { pointer: 'thetaDeg', detail: 'must be at most 90; got 91' },
      { pointer: 'colour', detail: 'is not a known field' },
    ]);
  });

  it('names the file and the line of what it cannot read', async () => {
    const broken = { name: 'cell_L2.00.s1p', bytes: Buffer.from('# GHz S RI R 50\n24 0.1 0.2\n25 0.1 nan\n') };
    const answer = await inspect(uploadForm([broken], {}));
    const [file] = (answer.json as Inspection).files;
    expect(file).toMatchObject({ name: 'cell_L2.00.s1p', status: 'refused' });
    expect(file?.messages).toContainEqual(expect.objectContaining({ severity: 'error', line: 3 }));
  });

  it('refuses a request without files and one whose form is not JSON', async () => {
    expectInvalid(await inspect(uploadForm([], { inspection: {} })), [
      { pointer: '#/files', detail: 'no file came with the request; send one or more in the field "files"' },
    ]);
    expectInvalid(await inspect(uploadForm(cellFilesOf(FOUR), { inspection: '{' })), [{ pointer: '#/inspection', detail: 'is not JSON' }]);
  });

  it('keeps an accepted edition with its original bytes', async () => {
    const edition = await accepted();
    expect(edition).toMatchObject({ state: 'accepted', number: null, cellCount: 4, fileCount: 5, fromGHz: 24, toGHz: 32, thetasDeg: [0], acceptedBy: { name: 'Lab (demo)' } });
    const { items } = (await lab.get(`/api/library/editions/${edition.id}/files`)).json as { items: KeptFile[] };
    expect(items).toHaveLength(5);
    const [first] = cellFilesOf(FOUR).filter(({ name }) => name.endsWith('.s1p'));
    const kept = items.find(({ name }) => name === first?.name);
    const answer = await designer.get(`/api/library/files/${kept?.sha256}`);
    expect(answer.bytes.equals(first?.bytes ?? Buffer.alloc(0))).toBe(true);
    expect(answer.headers.get('content-disposition')).toContain('attachment');
    expect(createHash('sha256').update(answer.bytes).digest('hex')).toBe(kept?.sha256);
  });

  it('gives equal data an equal hash and refuses a second family of the same name', async () => {
    const name = `Twice ${randomUUID().slice(0, 8)}`;
    const first = await accepted(name);
    const again = await send(lab, `/api/library/families/${first.familyId}/editions`, uploadForm(cellFilesOf(FOUR), { import: importOf(FOUR, { description: { ...descriptionOf(FOUR), name } }) }));
    expect((again.json as EditionDetail).hash).toBe(first.hash);
    const second = await send(lab, '/api/library/families', uploadForm(cellFilesOf(FOUR), { import: importOf(FOUR, { description: { ...descriptionOf(FOUR), name } }) }));
    expect(second.status).toBe(409);
  });

  it('answers the responses as a binary block that holds the numbers of the file', async () => {
    const edition = await accepted();
    const answer = await designer.get(`/api/library/editions/${edition.id}/responses`);
    const { head, arrays } = readBinaryBlock(new Uint8Array(answer.bytes).buffer);
    expect(head).toEqual({ editionId: edition.id, cellCount: 4 });
    expect(arrays['frequenciesHz']?.[0]).toBe(24e9);
    const text = cellFilesOf(FOUR).find(({ name }) => name.endsWith('.s1p'))?.bytes.toString('utf8') ?? '';
    const [, re, im] = (text.split('\n').find((line) => /^\d/.test(line)) ?? '').trim().split(/\s+/).map(Number);
    expect(Array.from(arrays['values']?.slice(0, 2) ?? [])).toEqual([re, im]);
    expect(arrays['present']?.length).toBe(4 * 41);
  });

  it('publishes under the next number, once, and then nothing changes it', async () => {
    const edition = await published();
    expect(edition).toMatchObject({ state: 'published', number: 1, note: 'for use', publishedBy: { name: 'Lab (demo)' } });
    const again = await lab.post(`/api/library/editions/${edition.id}/publication`, { note: 'again' });
    expectProblem(again, problemOf('conflict', 409, 'This edition is published already, as number 1.'));
    expect((await lab.delete(`/api/library/editions/${edition.id}`)).status).toBe(409);
    await expect(api.query(`UPDATE edition SET note = 'other' WHERE id = $1`, [edition.id])).rejects.toThrow('never changed');
    await expect(api.query('DELETE FROM edition WHERE id = $1', [edition.id])).rejects.toThrow('never changed');
    await expect(api.query('DELETE FROM edition_file WHERE edition_id = $1', [edition.id])).rejects.toThrow('never changed or removed');
    await expect(api.query(`UPDATE kept_file SET body = ''`)).rejects.toThrow('never changed');
  });

  it('never changes the content of an accepted edition either', async () => {
    const edition = await accepted();
    await expect(api.query(`UPDATE edition SET note = 'other' WHERE id = $1`, [edition.id])).rejects.toThrow('never changed');
  });

  it('numbers publications that race each other without a gap or a double', async () => {
    const name = `Race ${randomUUID().slice(0, 8)}`;
    const first = await accepted(name);
    const form = (): FormData => uploadForm(cellFilesOf(FOUR), { import: importOf(FOUR, { description: { ...descriptionOf(FOUR), name } }) });
    const others = await Promise.all([1, 2, 3].map(async () => (await send(lab, `/api/library/families/${first.familyId}/editions`, form())).json as EditionDetail));
    const answers = await Promise.all([first, ...others].map(({ id }) => lab.post(`/api/library/editions/${id}/publication`, { note: 'race' })));
    expect(answers.map((answer) => (answer.json as EditionDetail).number).sort()).toEqual([1, 2, 3, 4]);
  });

  it('discards what was never published, with the files only it kept', async () => {
    const marked = [...cellFilesOf(FOUR), { name: 'only_here.txt', bytes: Buffer.from(randomUUID()) }];
    const name = `Gone ${randomUUID().slice(0, 8)}`;
    const answer = await send(lab, '/api/library/families', uploadForm(marked, { import: importOf(FOUR, { description: { ...descriptionOf(FOUR), name } }) }));
    const edition = answer.json as EditionDetail;
    const hash = createHash('sha256').update(marked.at(-1)?.bytes ?? '').digest('hex');
    expect((await lab.get(`/api/library/files/${hash}`)).status).toBe(200);
    expect((await lab.delete(`/api/library/editions/${edition.id}`)).status).toBe(204);
    expectNotFound(await lab.get(`/api/library/editions/${edition.id}`), 'edition');
    expectNotFound(await lab.get(`/api/library/families/${edition.familyId}`), 'family');
    expectNotFound(await lab.get(`/api/library/files/${hash}`), 'file');
  });

  it('finds families by name, band, period and angle', async () => {
    const { familyName } = await published();
    const names = async (query: string): Promise<string[]> => ((await designer.get(`/api/library/families?${query}`)).json as { items: FamilySummary[] }).items.map(({ name }) => name);
    expect(await names(`text=${encodeURIComponent(familyName.toUpperCase())}&frequencyGHz=28&periodMm=5&thetaDeg=0`)).toEqual([familyName]);
    expect(await names(`text=${encodeURIComponent(familyName)}&frequencyGHz=10`)).toEqual([]);
    expect(await names(`text=${encodeURIComponent(familyName)}&periodMm=15`)).toEqual([]);
    expect(await names(`text=${encodeURIComponent(familyName)}&thetaDeg=30`)).toEqual([]);
    expect(await names(`text=${encodeURIComponent('%')}`)).toEqual([]);
  });

  it('lets only the lab change it, and shows it to nobody outside the team', async () => {
    const edition = await accepted();
    expectNotAllowed(await send(designer, '/api/library/inspections', uploadForm(cellFilesOf(FOUR), {})), 'This needs the role lab.');
    expectNotAllowed(await (await api.signedIn('fabricator')).get('/api/library/families'), 'This needs the role designer or lab or reviewer or range or administrator.');
    expectNotFound(await (await api.signedIn(STRANGER)).get(`/api/library/editions/${edition.id}`), 'edition');
    expectNotSignedIn(await api.anonymous().get('/api/library/families'));
  });

  it('accepts once for one Idempotency-Key, however often the request comes', async () => {
    const name = `Once ${randomUUID().slice(0, 8)}`;
    const form = (): FormData => uploadForm(cellFilesOf(FOUR), { import: importOf(FOUR, { description: { ...descriptionOf(FOUR), name } }) });
    const headers = { 'idempotency-key': randomUUID() };
    const first = await lab.send('POST', '/api/library/families', { form: form(), headers });
    const second = await lab.send('POST', '/api/library/families', { form: form(), headers });
    expect([first.status, second.status]).toEqual([201, 201]);
    expect((second.json as EditionDetail).id).toBe((first.json as EditionDetail).id);
    expect(await api.query('SELECT 1 FROM edition WHERE family_id = $1', [(first.json as EditionDetail).familyId])).toHaveLength(1);
  });

  it('writes one audit row for acceptance and one for publication', async () => {
    const edition = await published();
    const rows = await api.query<{ action: string }>(`SELECT action FROM audit_row WHERE object = $1 ORDER BY sequence`, [`edition:${edition.id}`]);
    expect(rows.map(({ action }) => action)).toEqual(['edition.accepted', 'edition.published']);
  });
});
