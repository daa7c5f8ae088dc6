import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { writeBinaryBlock } from '../../../shared/contracts/binary-block';
import { ComparisonClient } from './comparison-client';
import { unpackComparison } from './unpack-comparison';

const ID = '00000000-0000-4000-8000-000000000002';
const side = { reference: `draft:${ID}`, panelId: ID, panelName: 'Panel', projectName: 'Project', hash: 'a'.repeat(64), editionName: null, requirement: { met: 1, short: 0, open: 0 } };
const head = {
  before: side,
  after: side,
  parameterCount: 41,
  parameters: [],
  cells: { kind: 'compared', total: 2, changed: 1, errorOver15Before: 0, errorOver15After: 0, rmsErrorBeforeDeg: 0, rmsErrorAfterDeg: 1.5 },
  cuts: [{ request: { plane: 'along', angleDeg: [-90, 90, 90] }, shiftU: 0, floorDbi: -15 }],
  uv: { size: 2, shiftU: 0.25, shiftV: -0.5 },
  figures: [],
  deciding: null,
};
const arrays = {
  'cells.xMm': Float64Array.of(-2.5, 2.5),
  'cells.yMm': Float64Array.of(0, 0),
  'cells.changed': Uint8Array.of(0, 1),
  'cells.parameterChangeMm': Float64Array.of(0, 0),
  'cells.phaseChangeDeg': Float64Array.of(0, -90),
  'cells.errorChangeDeg': Float64Array.of(0, 1.5),
  'cuts.0.angleDeg': Float64Array.of(-90, 0, 90),
  'cuts.0.beforeDbi': Float64Array.of(-40, 34, -40),
  'cuts.0.afterDbi': Float64Array.of(-40, 35, -40),
  'cuts.0.differenceDb': Float64Array.of(NaN, 1, NaN),
  'uv.differenceDb': Float32Array.of(0, 1, -1, 0),
};
const whole = {
  ...head,
  cells: { ...head.cells, arrays: { xMm: [-2.5, 2.5], yMm: [0, 0], changed: [0, 1], parameterChangeMm: [0, 0], phaseChangeDeg: [0, -90], errorChangeDeg: [0, 1.5] } },
  cuts: [{ ...head.cuts[0], angleDeg: [-90, 0, 90], beforeDbi: [-40, 34, -40], afterDbi: [-40, 35, -40], differenceDb: [null, 1, null] }],
  uv: { ...head.uv, differenceDb: [0, 1, -1, 0] },
};

describe('ComparisonClient', () => {
  let client: ComparisonClient;
  let server: HttpTestingController;
  beforeEach(() => {
    TestBed.configureTestingModule({ providers: [provideHttpClient(), provideHttpClientTesting()] });
    client = TestBed.inject(ComparisonClient);
    server = TestBed.inject(HttpTestingController);
  });
  afterEach(() => server.verify());

  it('asks for bytes and reads them as a comparison', async () => {
    const outcome = client.compare('revision:a', 'draft:b');
    const call = server.expectOne('/api/comparisons?before=revision:a&after=draft:b');
    expect([call.request.responseType, call.request.headers.get('Accept')]).toEqual(['arraybuffer', 'application/octet-stream']);
    call.flush(writeBinaryBlock(head, arrays).buffer);
    expect(await outcome).toEqual({ kind: 'found', value: whole });
  });

  it('reads a refusal although the call was for bytes', async () => {
    const outcome = client.compare('revision:a', 'draft:b');
    const problem = { type: '/problems/invalid-input', title: 'Not valid', status: 422, detail: '1 value is not valid.', errors: [{ pointer: '#/design/panel', detail: 'after: too many cells' }] };
    const bytes = Uint8Array.from(JSON.stringify(problem), (letter) => letter.charCodeAt(0)).buffer;
    server.expectOne(() => true).flush(bytes, { status: 422, statusText: 'Unprocessable' });
    expect(await outcome).toEqual({ kind: 'refused', problem });
  });

  it('tells a server that is out of reach from a refusal', async () => {
    const outcome = client.compare('revision:a', 'draft:b');
    server.expectOne(() => true).error(new ProgressEvent('error'));
    expect(await outcome).toEqual({ kind: 'unreachable' });
  });
});

describe('unpackComparison', () => {
  it('puts every array back in its place, with null in the gaps of a cut', () => {
    expect(unpackComparison({ head, arrays })).toEqual(whole);
  });

  it('keeps the reason where cells were not compared', () => {
    const cells = { kind: 'lattices-differ', reason: 'one lattice is rectangular, the other triangular' };
    expect(unpackComparison({ head: { ...head, cells }, arrays }).cells).toEqual(cells);
  });

  it('misses an array that the head announces', () => {
    const { 'uv.differenceDb': _map, ...others } = arrays;
    expect(() => unpackComparison({ head, arrays: others })).toThrow('the comparison lacks its array uv.differenceDb');
  });

  it('refuses a head that breaks the contract', () => {
    expect(() => unpackComparison({ head: { ...head, uv: { size: 2 } }, arrays })).toThrow('shiftU');
  });
});
