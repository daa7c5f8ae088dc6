import type { DesignDocument, Illumination } from '../../../../shared/model/design-document';

/** Another way to light the panel that starts from the present one: a wave from where the horn stands, or a horn where it came from. */
export function illuminationOfKind(design: DesignDocument, kind: Illumination['kind']): Illumination {
  const { illumination } = design;
  if (illumination.kind === kind) return illumination;
  return illumination.kind === 'horn' ? waveFromHorn(illumination) : hornFromWave(design, illumination);
}

function waveFromHorn({ positionMm, polarisation }: Extract<Illumination, { kind: 'horn' }>): Illumination {
  const [x, y, z] = positionMm;
  const thetaDeg = Math.min(89.9, tidy((Math.atan2(Math.hypot(x, y), Math.abs(z)) * 180) / Math.PI));
  const phiDeg = Math.hypot(x, y) === 0 ? 0 : tidy((Math.atan2(y, x) * 180) / Math.PI);
  return { kind: 'plane-wave', thetaDeg, phiDeg, polarisation };
}

function hornFromWave({ panel }: DesignDocument, { thetaDeg, phiDeg, polarisation }: Extract<Illumination, { kind: 'plane-wave' }>): Illumination {
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
