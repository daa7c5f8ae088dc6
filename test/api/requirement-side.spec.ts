import JSZip from 'jszip';
import type { Comparison } from '../../shared/contracts/comparisons';
import type { PredictionReply } from '../../shared/contracts/predictions';
import type { RevisionDetail } from '../../shared/contracts/projects';
import { readCsv } from '../../shared/files/csv-table';
import type { DesignDocument } from '../../shared/model/design-document';
import { STARTING_DESIGN } from '../../shared/model/starting-design';
import { Api } from '../support/api';
import type { Answer, ApiClient } from '../support/api-client';
import { bodyOf, draw, freeze, newPanel } from '../support/panels';
import { expectInvalid } from '../support/problems';

/** Predictions run in the test's own thread here, several to a test. */
jest.setTimeout(60_000);

const asking = (requirement: Partial<DesignDocument['requirement']>): DesignDocument => ({
  ...STARTING_DESIGN,
  panel: { ...STARTING_DESIGN.panel, outline: { kind: 'rectangle', widthMm: 60, heightMm: 60 } },
  requirement: { ...STARTING_DESIGN.requirement, ...requirement },
});

const full = asking({
  mask: { kind: 'published', id: 'itu-r-s465-6' },
  crossPolarMask: { kind: 'custom', points: [[0, 0], [90, -20]] },
  transmitter: { powerW: 2, lossDb: 1, dutyPercent: 50, occupiedBandwidthGHz: 0.036, referenceBandwidthGHz: 4e-6, densityMask: { kind: 'formula', segments: [{ fromDeg: 5, toDeg: 90, expression: '-10 - 25*log10(theta)' }] } },
  link: { kind: 'hop', distanceM: 2000, farGainDbi: 20, minReceivedDbm: -90 },
  receiver: { antennaTemperatureK: 100, lineLossDb: 0.5, noiseFigureDb: 2, minGainOverTemperatureDbPerK: 60 },
});

describe('masks, link and exposure over the API', () => {
  let api: Api;
  let designer: ApiClient;
  beforeAll(async () => {
    api = await Api.start();
    designer = await api.signedIn('designer');
  }, 60_000);
  afterAll(() => api.close());

  const predict = (design: unknown): Promise<Answer> => designer.post('/api/predictions', { design });

  it('answers verdicts, findings, budgets and the exposure estimate', async () => {
    const { figures, verdicts } = bodyOf<PredictionReply>(await predict(full), 200);
    expect(verdicts.map(({ line, verdict }) => `${line} ${verdict}`)).toEqual(
      expect.arrayContaining(['received-power meets', 'gain-over-temperature falls-short', 'cross-polar-mask not-evaluated', expect.stringMatching(/^mask (meets|falls-short)$/), expect.stringMatching(/^eirp-density (meets|falls-short)$/)]),
    );
    expect(figures.maskFindings).toMatchObject({ violationCount: expect.any(Number) });
    expect(figures.exposure).toMatchObject({ averagePowerW: expect.closeTo(0.7943, 4), fccPublic: { limitWPerM2: 10, averagingMin: 30 } });
    expect(figures.link).toMatchObject({ receivedDbm: expect.any(Number) });
  });

  it('refuses a published envelope it does not know, with the list of those it knows', async () => {
    expectInvalid(await predict(asking({ mask: { kind: 'published', id: 's-465' } })), [
      { pointer: '#/design/requirement/mask/id', detail: 'there is no published envelope "s-465"; known are itu-r-s465-6, itu-r-s580-6, itu-r-f699-8, fcc-25-209-a1, fcc-25-209-a2' },
    ]);
  });

  it.each([
    ['process.exit(1)', '"process" is not known'],
    ['theta = 3', '"=" is not expected, at character 7'],
    ['f(x) = x', '"f" is not known'],
    ['"".constructor', '""" is not expected, at character 1'],
  ])('refuses the formula %s with its place', async (expression, detail) => {
    const answer = await predict(asking({ mask: { kind: 'formula', segments: [{ fromDeg: 1, toDeg: 90, expression }] } }));
    expect(answer.status).toBe(422);
    expect(answer.json).toMatchObject({ errors: [{ pointer: '#/design/requirement/mask/segments/0/expression', detail: expect.stringContaining(detail) }] });
  });

  it('keeps them in a revision, tells them apart in a comparison and writes them into the export', async () => {
    const panel = await newPanel(designer, full);
    const first = await freeze(designer, panel.id);
    expect(first.design.requirement).toEqual(full.requirement);
    await draw(designer, panel.id, { ...full, requirement: { ...full.requirement, transmitter: { ...full.requirement.transmitter, powerW: 4 } } });
    const second = await freeze(designer, panel.id, 'twice the power');
    const { parameters, figures } = bodyOf<Comparison>(await designer.get(`/api/comparisons?before=revision:${first.id}&after=revision:${second.id}`), 200);
    expect(parameters).toEqual([{ pointer: '/requirement/transmitter/powerW', label: 'Transmitter power', unit: 'W', before: 2, after: 4 }]);
    for (const id of ['eirp', 'received-power']) expect(figures.find((row) => row.id === id)).toMatchObject({ change: expect.closeTo(3.0103, 4) });
    const rows = await figureRows(second);
    expect(rows.get('eirpDbw')).toMatchObject({ unit: 'dBW' });
    expect(rows.get('exposure.fccPublic.distanceM')).toMatchObject({ unit: 'm' });
    expect(rows.get('exposure.nearFieldWPerM2')).toMatchObject({ unit: 'W/m2' });
    expect(rows.get('requirement.received-power')).toMatchObject({ unit: 'dBm', limit: '-90', verdict: 'meets' });
    expect(rows.get('requirement.cross-polar-mask')).toMatchObject({ verdict: 'not-evaluated' });
  });

  async function figureRows(revision: RevisionDetail): Promise<Map<string, Record<string, string>>> {
    const zip = await JSZip.loadAsync((await designer.get(`/api/revisions/${revision.id}/export`)).bytes);
    const file = Object.values(zip.files).find(({ name }) => name.endsWith('/figures.csv'));
    const read = readCsv(Buffer.from(await (file?.async('nodebuffer') ?? Promise.reject(new Error('no figures.csv')))));
    if (read.kind === 'refused') throw new Error(JSON.stringify(read.messages));
    const [header, ...rows] = read.table.rows;
    return new Map(rows.map((row) => [row[0], Object.fromEntries(header.map((name, i) => [name, row[i]]))]));
  }
});
