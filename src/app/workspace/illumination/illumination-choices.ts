import type { DesignDocument, Illumination } from '../../../../shared/model/design-document';

type PlaneWave = Extract<Illumination, { kind: 'plane-wave' }>;
type GuidedWave = Extract<Illumination, { kind: 'guided-wave' }>;

/** Another way to light the panel that starts from the present one: a wave from where the horn stands, or a horn where it came from. */
export function illuminationOfKind(design: DesignDocument, kind: Illumination['kind']): Illumination {
  const { illumination } = design;
  const { polarisation } = illumination;
  if (illumination.kind === kind) return illumination;
  if (kind === 'guided-wave') return { kind, launch: launchOfKind('plane'), effectiveIndex: 1.6, leakageNpPerM: firstLeakage(design), polarisation };
  const wave: PlaneWave = illumination.kind === 'horn' ? waveFromHorn(illumination) : illumination.kind === 'plane-wave' ? illumination : { kind: 'plane-wave', thetaDeg: 0, phiDeg: 0, polarisation };
  return kind === 'plane-wave' ? wave : hornFromWave(design, wave);
}

/** The design lit in another way, with cells that can be: an edition is measured under waves from outside, resonant cells need a guided one. */
export function designOfIllumination(design: DesignDocument, kind: Illumination['kind']): DesignDocument {
  const illumination = illuminationOfKind(design, kind);
  const { cells, prediction } = design;
  // A guided wave has no angle of incidence, so the vector model has nothing to go by.
  if (kind === 'guided-wave' && prediction.model === 'vector') return designOfIllumination({ ...design, prediction: { ...prediction, model: 'scalar' } }, kind);
  if (kind === 'guided-wave' && cells.kind === 'edition') return { ...design, illumination, cells: { kind: 'resonant', rule: 'projection', states: null } };
  if (kind !== 'guided-wave' && cells.kind === 'resonant') return { ...design, illumination, cells: { kind: 'ideal', levels: null } };
  return { ...design, illumination };
}

export function launchOfKind(kind: GuidedWave['launch']['kind']): GuidedWave['launch'] {
  return kind === 'plane' ? { kind, directionDeg: 0 } : { kind, centreMm: [0, 0], radiusMm: 10 };
}

/** The leakage with the best product of taper and leaked share across the panel, alpha L = 1.2564. */
function firstLeakage({ panel: { outline } }: DesignDocument): number {
  const lengthMm = outline.kind === 'polygon' ? Math.max(...outline.pointsMm.map(([x]) => x)) - Math.min(...outline.pointsMm.map(([x]) => x)) : outline.widthMm;
  return Math.min(1000, Number((1256.4 / lengthMm).toPrecision(3)));
}

function waveFromHorn({ positionMm, polarisation }: Extract<Illumination, { kind: 'horn' }>): PlaneWave {
  const [x, y, z] = positionMm;
  const thetaDeg = Math.min(89.9, tidy((Math.atan2(Math.hypot(x, y), Math.abs(z)) * 180) / Math.PI));
  const phiDeg = Math.hypot(x, y) === 0 ? 0 : tidy((Math.atan2(y, x) * 180) / Math.PI);
  return { kind: 'plane-wave', thetaDeg, phiDeg, polarisation };
}

function hornFromWave({ panel }: DesignDocument, { thetaDeg, phiDeg, polarisation }: PlaneWave): Illumination {
  const { outline } = panel;
  const spans = outline.kind === 'polygon' ? outline.pointsMm.flat().map((value) => 2 * Math.abs(value)) : [outline.widthMm, outline.heightMm];
  // f/D near 0.9: a common start for a horn of moderate gain.
  const distance = 0.9 * Math.max(...spans);
  const side = panel.operation === 'transmit' ? -1 : 1;
  const [theta, phi] = [(thetaDeg * Math.PI) / 180, (phiDeg * Math.PI) / 180];
  const along = (share: number): number => Math.round(distance * share * 10) / 10 || 0;
  const positionMm: [number, number, number] = [
    along(Math.sin(theta) * Math.cos(phi)),
    along(Math.sin(theta) * Math.sin(phi)),
    side * Math.max(1, along(Math.cos(theta))),
  ];
  return { kind: 'horn', positionMm, aimMm: [0, 0, 0], exponentE: 6.5, exponentH: 6.5, polarisation };
}

function tidy(deg: number): number {
  return Math.round(deg * 1e4) / 1e4;
}
