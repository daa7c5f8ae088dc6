import type { DesignDocument } from '../../model/design-document';
import { figures as figuresSchema } from '../../model/figures';
import { directionOf } from '../../waves/conventions';
import { EXAMPLE_DESIGN, exampleDesign } from '../example-design';
import { hornPatternField, hornPower, hornSampler } from '../horn-field';
import { predictDesign } from '../predict-design';
import { siDesign, type SiHorn } from '../si-design';
import { shadowDistanceM, shadowedCells } from './feed-shadow';
import { denseLevels, meanResponse, stateChoices } from './specular-part';
import { meetsPanel } from './spillover-direction';

const hornOf = (design: DesignDocument): SiHorn => {
  const { illumination } = siDesign(design);
  if (illumination.kind !== 'horn') throw new Error('no horn');
  return illumination;
};
const blocked = (changes: Partial<DesignDocument> = {}): DesignDocument => {
  const { illumination } = EXAMPLE_DESIGN;
  if (illumination.kind !== 'horn') throw new Error('no horn');
  return exampleDesign({ requirement: { ...EXAMPLE_DESIGN.requirement, beams: [{ thetaDeg: 0, phiDeg: 0 }] }, illumination: { ...illumination, positionMm: [0, 0, 240], blockageRadiusMm: 40 }, ...changes });
};

describe('the shadow of a feed', () => {
  it('lies where the rays towards the beam meet the disc, moved aside by a tilted beam', () => {
    const places = { xM: Float64Array.of(0, 0.03, -0.1), yM: new Float64Array(3) };
    const disc = { position: { xM: 0, yM: 0, zM: 0.2 }, radiusM: 0.02 };
    expect([...shadowedCells(places, disc, directionOf(0, 0))]).toEqual([1, 0, 0]);
    // tan 26.57 deg = 0.5: the ray of the cell at -0.1 m passes the middle of the disc.
    expect([...shadowedCells(places, disc, directionOf(Math.atan(0.5), 0))]).toEqual([0, 0, 1]);
    expect(shadowDistanceM(places, disc, directionOf(Math.atan(0.5), 0))[2]).toBeCloseTo(0, 12);
  });

  it('is no shadow where the horn stands behind the cells', () => {
    const disc = { position: { xM: 0, yM: 0, zM: -0.2 }, radiusM: 0.02 };
    expect([...shadowedCells({ xM: Float64Array.of(0), yM: Float64Array.of(0) }, disc, directionOf(0, 0))]).toEqual([0]);
  });
});

describe('a panel with its feed in the way', () => {
  it('loses the field of the blocked cells at the beam, and gains what the rest radiates', () => {
    const [open, shut] = [blocked({ illumination: { ...blocked().illumination, blockageRadiusMm: undefined } as DesignDocument['illumination'] }), blocked()].map((design) => predictDesign(design, { include: {} }).figures);
    expect(figuresSchema.safeParse(shut).success).toBe(true);
    expect(open.blockage).toBeUndefined();
    expect(shut.blockage?.cells).toBeGreaterThan(10);
    const atBeam = Number(shut.blockage?.atBeamDb);
    expect(atBeam).toBeLessThan(-0.5);
    expect(Number(shut.gainDbi)).toBeCloseTo(Number(shut.directivityDbi) + Number(shut.spilloverDb) + Number(shut.cellLossDb) + Number(shut.blockage?.powerDb), 9);
    // Gain at the beam falls as the field does; what is left is the sampling of the integral of power.
    expect(Number(shut.gainAtBeamDbi) - Number(open.gainAtBeamDbi)).toBeCloseTo(atBeam, 0.7);
    expect(Number(shut.sidelobeDb.across)).toBeGreaterThan(Number(open.sidelobeDb.across));
  });

  it('blocks nothing of a transmitting panel, whose horn is behind', () => {
    const { figures } = predictDesign(blocked({ panel: { ...EXAMPLE_DESIGN.panel, operation: 'transmit' } }), { include: {} });
    expect(figures.blockage).toBeUndefined();
  });

  it('has the same blocked cells as vectors', () => {
    const { figures } = predictDesign(blocked({ prediction: { ...EXAMPLE_DESIGN.prediction, model: 'vector' } }), { include: {} });
    expect(figures.blockage).toMatchObject({ cells: predictDesign(blocked(), { include: {} }).figures.blockage?.cells, powerDb: { kind: 'vector-model' } });
  });
});

describe('spillover past the rim', () => {
  const horn = hornOf(EXAMPLE_DESIGN);
  const { outline } = siDesign(EXAMPLE_DESIGN).panel;

  it('misses the panel where the straight way does', () => {
    expect(meetsPanel(horn, outline, directionOf(Math.PI, 0))).toBe(true);
    expect(meetsPanel(horn, outline, directionOf(1.7, 0))).toBe(false);
    expect(meetsPanel(horn, outline, directionOf(0.3, 0))).toBe(false);
  });

  it('has the field of the horn that lights the cells', () => {
    const skew: SiHorn = { ...horn, exponentE: 4, exponentH: 9 };
    const sample = { ...hornSampler(skew)(0.05, -0.03) };
    const [dx, dy, dz] = [0.05 - skew.position.xM, -0.03 - skew.position.yM, -skew.position.zM];
    const length = Math.hypot(dx, dy, dz);
    expect(hornPatternField(skew, { u: dx / length, v: dy / length, w: dz / length }) / length).toBeCloseTo(sample.field, 12);
  });

  it('stands in a cut behind the panel, and nothing where the panel itself is', () => {
    const { cuts } = predictDesign(EXAMPLE_DESIGN, { include: { cuts: [{ phiDeg: 0, thetaDeg: [90, 180, 5] }] } });
    const cut = cuts?.[0];
    if (!cut) throw new Error('no cut');
    const at = (deg: number): number => cut.gainDbi[cut.angleDeg.indexOf(deg)];
    expect(at(180)).toBe(-200);
    const past = directionOf((120 * Math.PI) / 180, 0);
    expect(at(120)).toBeCloseTo(10 * Math.log10((4 * Math.PI * hornPatternField(horn, past) ** 2) / hornPower(horn)), 9);
  });
});

describe('the specular part', () => {
  it('is the mean response by power: nothing of opposite halves, all of a plate', () => {
    const of = (phases: number[]): number => Math.hypot(...meanResponse({ magnitude: new Float64Array(2).fill(1), phaseRad: Float64Array.from(phases), amplitude: new Float64Array(2).fill(3) }));
    expect(of([0, Math.PI])).toBeCloseTo(0, 12);
    expect(of([1, 1])).toBeCloseTo(1, 12);
  });

  it('of four even states vanishes, and their beam is sinc 45 degrees', () => {
    const even = [0, 1, 2, 3].map((i) => (i * Math.PI) / 2);
    expect(stateChoices(even).map(({ share }) => share)).toEqual([0.25, 0.25, 0.25, 0.25]);
    const { beam, specular } = denseLevels(even);
    expect(beam).toBeCloseTo(Math.sin(Math.PI / 4) / (Math.PI / 4), 12);
    expect(specular).toBeCloseTo(0, 12);
  });

  it('of a predicted panel is told against a plate', () => {
    const { figures } = predictDesign(exampleDesign({ cells: { kind: 'inline', cells: [{ phaseDeg: 10, magnitude: 0.9 }] } }), { include: {} });
    expect(figures.specular?.meanResponseDb).toBeCloseTo(20 * Math.log10(0.9), 9);
  });
});
