import { exportReadme, type ReadmeFacts } from './export-readme';

const id = '6f9619ff-8b86-4d01-b42d-00cf4fc964ff';
const facts: ReadmeFacts = {
  header: {
    id,
    panelId: id,
    number: 3,
    hash: 'a'.repeat(64),
    parentId: null,
    parentNumber: null,
    restoredFromNumber: null,
    author: { id, name: 'Designer' },
    message: `A message ${'that goes on '.repeat(20)}${'x'.repeat(120)}`,
    createdAt: '2026-12-01T14:02:31.000Z',
  },
  projectName: 'Project',
  panelName: 'Panel',
  invented: false,
  edition: { familyName: 'Ring and patch', number: 2, provenance: 'simulated', limits: 'Normal incidence only.' },
  warnings: [{ code: 'image-lobe', pointer: '#/cells', severity: 'warn', message: 'Two levels give an image.', numbers: {} }],
  design: { prediction: { receiveExponent: 0.5, radiateExponent: 0.5 } },
  engineVersion: 'scalar-1',
  productVersion: '0.1.0',
};
const flat = (text: string): string => text.replace(/\s+/g, ' ');

describe('the text of an export', () => {
  it('breaks lines at 78 characters, except within a longer word', () => {
    const long = exportReadme(facts).split('\n').filter((line) => line.length > 78);
    expect(long).toEqual(['x'.repeat(120)]);
  });

  it('says whose cells they are, and repeats every warning of the prediction', () => {
    const text = flat(exportReadme(facts));
    expect(text).toContain('- The cells come from "Ring and patch", edition 2: simulated. Normal incidence only.');
    expect(text).toContain('- Two levels give an image.');
    expect(text).not.toContain('INVENTED');
  });

  it('says which model predicted and what it leaves out', () => {
    expect(flat(exportReadme(facts))).toContain('by a scalar model of independent cells; nothing was measured on this panel. There is no cross-polar field in it');
    const design = { prediction: { receiveExponent: 0.5, radiateExponent: 0.5, model: 'vector', cellFactor: 'normal' } } as const;
    const text = flat(exportReadme({ ...facts, design }));
    expect(text).toContain('by a vector model of independent cells (power-wave re-radiation, cell factor normal)');
    expect(text).toContain('the cuts hold the cross-polar one too');
  });

  it('cautions whoever mounts or lights the panel, and calls nothing safe or compliant', () => {
    const text = flat(exportReadme(facts));
    expect(text).toContain('verify by measurement before use.');
    expect(text).toContain('Do not enter the beam or the feed–panel space while transmitting.');
    expect(text).toContain('Confirm authorisation for frequency, power, place and dates.');
    expect(text).toContain('must follow local codes and be done or checked by a licensed professional.');
    expect(text).not.toMatch(/\b(safe|compliant|certified|approved)\b/i);
  });

  it('says that ideal cells cannot be made, and calls invented what is', () => {
    const text = flat(exportReadme({ ...facts, edition: null, invented: true }));
    expect(text).toContain('cannot be made as they stand');
    expect(text).toContain('INVENTED: this project is a demonstration.');
  });
});
