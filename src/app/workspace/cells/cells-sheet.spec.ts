import type { FamilySummary } from '../../../../shared/contracts/library';
import { replacedAt } from '../../../../shared/model/design-pointer';
import { NEW_PANEL_DESIGN, STARTING_DESIGN } from '../../../../shared/model/starting-design';
import { LibraryClient } from '../../api/library-client';
import { sheetRig } from '../fields/sheet-rig';
import { CellsSheet } from './cells-sheet';

const EDITION_ID = '6f9619ff-8b86-4d01-b42d-00cf4fc96401';
const person = { id: '6f9619ff-8b86-4d01-b42d-00cf4fc964fd', name: 'Cell lab' };
const family: FamilySummary = {
  id: '6f9619ff-8b86-4d01-b42d-00cf4fc96400',
  name: 'Ring and patch 5 mm',
  kind: 'ring and patch',
  operation: 'reflect',
  periodXMm: 5,
  periodYMm: 5,
  designFrequencyGHz: 28,
  provenance: 'measured',
  useCount: 0,
  editions: [
    {
      id: EDITION_ID,
      familyId: '6f9619ff-8b86-4d01-b42d-00cf4fc96400',
      familyName: 'Ring and patch 5 mm',
      number: 3,
      state: 'published',
      hash: 'a'.repeat(64),
      cellCount: 33,
      fileCount: 33,
      fromGHz: 26,
      toGHz: 30,
      thetasDeg: [0, 50],
      phisDeg: [0],
      verdict: 'pass',
      note: 'Third edition',
      acceptedBy: person,
      acceptedAt: '2026-12-01T14:02:31Z',
      publishedBy: person,
      publishedAt: '2026-12-01T14:02:31Z',
    },
  ],
};

const rig = (design = STARTING_DESIGN, families: readonly FamilySummary[] = [family]) =>
  sheetRig(CellsSheet, design, [{ provide: LibraryClient, useValue: { families: async () => families } }]);

describe('CellsSheet', () => {
  it('offers levels for ideal cells', async () => {
    const { workspace, choose, enter, header } = await rig();
    await choose('Levels');
    expect(workspace.design().cells).toEqual({ kind: 'ideal', levels: 4 });
    await enter('Number of levels', '8');
    expect(header.head().subtitle).toBe('ideal, 8 levels 45.00° apart');
    await enter('Number of levels', '1');
    expect(workspace.design().cells).toEqual({ kind: 'ideal', levels: 8 });
  });

  it('takes the controls of ideal cells away while an edition is being chosen', async () => {
    const { text, choose } = await rig();
    expect(text()).toContain('Phase of ideal cells');
    await choose('Library edition');
    expect(text()).toContain('Choose one of the published editions');
    expect(text()).not.toContain('Phase of ideal cells');
  });

  it('uses an edition of the library, which it says how it suits', async () => {
    const { workspace, press, text, fixture } = await rig();
    await fixture.whenStable();
    expect(text()).toContain('Ring and patch 5 mm, 3');
    expect(text()).toContain('fits period, band and incidence');
    await press('Use Ring and patch 5 mm, edition 3');
    expect(workspace.design().cells).toEqual({ kind: 'edition', editionId: EDITION_ID, rule: 'nearest-phase', excludedCells: [] });
    expect(text()).toContain('in use');
  });

  it('does not offer an edition that cannot serve the panel, and says why', async () => {
    const { element } = await rig(replacedAt(STARTING_DESIGN, '/requirement/designFrequencyGHz', 10));
    const button = element.querySelector<HTMLButtonElement>('[aria-label="Use Ring and patch 5 mm, edition 3"]');
    expect(button?.disabled).toBe(true);
    expect(button?.title).toBe('Data from 26 to 30 GHz; wanted 10 GHz');
  });

  it('keeps a what-if table while another kind is looked at', async () => {
    const { workspace, choose, enter, text } = await rig();
    await choose('What-if table');
    await enter('What-if cell 1 phase', '10');
    expect(text()).toContain('the largest gap round the circle is 100.0°, so a cell may be off by 50.0°');
    await choose('Ideal');
    await choose('What-if table');
    expect(workspace.design().cells).toMatchObject({ kind: 'inline', cells: [{ phaseDeg: 10 }, { phaseDeg: 90 }, { phaseDeg: 180 }, { phaseDeg: 270 }] });
  });

  it('takes over the reference phase that a search found', async () => {
    const { workspace, choose, field } = await rig();
    await choose('Searched');
    expect(workspace.design().referencePhaseDeg).toBe('search');
    await choose('Given');
    expect(workspace.design().referencePhaseDeg).toBe(0);
    expect(field('Reference phase').value).toBe('0');
  });

  it('says what to do when the library is empty', async () => {
    const { text } = await rig(STARTING_DESIGN, []);
    expect(text()).toContain('The library holds no published edition yet.');
  });

  it('goes over to the scalar model with time-modulated cells, which the vector one cannot take', async () => {
    const { workspace, choose } = await rig(NEW_PANEL_DESIGN);
    await choose('Time-modulated');
    expect(workspace.design().cells.kind).toBe('modulated');
    expect(workspace.design().prediction.model).toBe('scalar');
  });
});
