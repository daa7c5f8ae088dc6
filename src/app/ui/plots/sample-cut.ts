import type { CutFigure } from './cut-figure';

/** A cut of an evenly lit line of 20 wavelengths steered to 20 degrees, with an invented mask; for specs. */
function lineCut(beamDeg: number): { readonly angleDeg: Float64Array; readonly levelDb: Float64Array } {
  const angleDeg = Float64Array.from({ length: 901 }, (_, i) => -90 + 0.2 * i);
  const levelDb = angleDeg.map((angle) => {
    const x = 20 * Math.PI * (Math.sin((angle * Math.PI) / 180) - Math.sin((beamDeg * Math.PI) / 180));
    const field = Math.abs(x) < 1e-9 ? 1 : Math.sin(x) / x;
    return Math.max(-200, 34.76 + 20 * Math.log10(Math.abs(field)));
  });
  return { angleDeg, levelDb };
}

export const SAMPLE_CUT: CutFigure = {
  title: 'Cut along the beam',
  angleTitle: 'θ in the plane φ = 0°, °',
  levelTitle: 'gain, dBi',
  main: { label: 'draft', ...lineCut(20) },
  overlay: { label: 'revision 3, beam at 19.5°', ...lineCut(19.5) },
  forbidden: [
    { angleDeg: [23.8, 30, 90], levelDb: [20, 10, -2] },
    { angleDeg: [-90, 10, 16.2], levelDb: [-2, 10, 20] },
  ],
  forbiddenLabel: 'forbidden by the mask',
  least: { label: 'least gain, 34 dBi', angleDeg: 20, levelDb: 34 },
  marks: [
    { name: '1', angleDeg: 20, levelDb: 34.76 },
    { name: '2', angleDeg: 18.6, levelDb: 31.75 },
    { name: '3', angleDeg: 21.4, levelDb: 31.75 },
  ],
  fromDeg: -90,
  toDeg: 90,
  floorDb: -20,
  topDb: 40,
};
