import type { DesignDocument, KeepOut, Lattice, Outline, PatternGoal, Polarisation } from '../model/design-document';
import { radFromDeg } from '../units/angles';
import { dbToAmplitudeRatio } from '../units/decibels';
import { directionOf, type Direction } from '../waves/conventions';
import type { MaskGoal, SectorGoal } from './synthesis/projection-bounds';
import { feedEdgeM } from './guided-wave/guided-wave-illumination';

/*
 * The design in SI and radians. Millimetres, degrees and gigahertz end here: everything below this arrow of the
 * engine takes these types only.
 */

export interface SiPoint {
  readonly xM: number;
  readonly yM: number;
}

export interface SiPosition extends SiPoint {
  readonly zM: number;
}

export type SiOutline =
  | { readonly kind: 'rectangle'; readonly centre: SiPoint; readonly widthM: number; readonly heightM: number }
  | { readonly kind: 'ellipse'; readonly centre: SiPoint; readonly widthM: number; readonly heightM: number }
  | { readonly kind: 'polygon'; readonly points: readonly SiPoint[] };

export type SiLattice =
  | { readonly kind: 'rectangular'; readonly periodXM: number; readonly periodYM: number }
  | { readonly kind: 'triangular'; readonly periodXM: number; readonly rowSpacingM: number };

export interface SiPanel {
  readonly outline: SiOutline;
  readonly lattice: SiLattice;
  readonly keepOuts: readonly SiOutline[];
}

export interface SiBeam {
  readonly direction: Direction;
  readonly amplitude: number;
  readonly phaseRad: number;
}

export interface SiHorn {
  readonly kind: 'horn';
  readonly position: SiPosition;
  readonly aim: SiPosition;
  readonly exponentE: number;
  readonly exponentH: number;
  readonly polarisation: Polarisation;
  readonly blockageRadiusM?: number;
}

export interface SiPlaneWave {
  readonly kind: 'plane-wave';
  /** The direction it comes from. */
  readonly source: Direction;
  readonly polarisation: Polarisation;
}

export interface SiGuidedWave {
  readonly kind: 'guided-wave';
  readonly launch:
    | { readonly kind: 'plane'; readonly directionRad: number; readonly feedEdgeM: number }
    | { readonly kind: 'radial'; readonly centre: SiPoint; readonly radiusM: number };
  readonly effectiveIndex: number;
  readonly leakageNpPerM: number;
  readonly polarisation: Polarisation;
}

export type SiIllumination = SiHorn | SiPlaneWave | SiGuidedWave;

export type SiSynthesis =
  | { readonly kind: 'direct' }
  | { readonly kind: 'focus'; readonly point: SiPosition }
  | { readonly kind: 'vortex'; readonly order: number }
  | { readonly kind: 'projections'; readonly goal: SectorGoal | MaskGoal; readonly iterations: number }
  | { readonly kind: 'diffuse'; readonly blockColumns: number; readonly blockRows: number; readonly states: number; readonly seed: number };

export interface SiDesign {
  readonly designFrequencyHz: number;
  /** Edges of the band, where the requirement has one. */
  readonly bandHz?: readonly [number, number];
  readonly beams: readonly SiBeam[];
  readonly operation: 'reflect' | 'transmit';
  readonly panel: SiPanel;
  readonly illumination: SiIllumination;
  readonly synthesis: SiSynthesis;
  readonly referencePhaseRad: number | 'search';
  readonly receiveExponent: number;
  readonly radiateExponent: number;
  /** Present where the vector model is asked for. */
  readonly vectorModel?: SiVectorModel;
}

export interface SiVectorModel {
  readonly reradiation: 'power-wave' | 'aperture';
  readonly cellFactor: 'none' | 'normal' | 'beam';
  /** The wanted one, of the beam. */
  readonly polarisation: Polarisation;
}

const M_PER_MM = 1e-3;
const HZ_PER_GHZ = 1e9;

/** Takes a design document to SI and radians. Expects what designDocument of shared/model accepts; checks nothing. */
export function siDesign(design: DesignDocument): SiDesign {
  const { requirement, panel, prediction, referencePhaseDeg } = design;
  return {
    designFrequencyHz: requirement.designFrequencyGHz * HZ_PER_GHZ,
    ...(requirement.bandGHz ? { bandHz: [requirement.bandGHz[0] * HZ_PER_GHZ, requirement.bandGHz[1] * HZ_PER_GHZ] as const } : {}),
    beams: requirement.beams.map((beam) => ({
      direction: directionOf(radFromDeg(beam.thetaDeg), radFromDeg(beam.phiDeg)),
      amplitude: dbToAmplitudeRatio(beam.levelDb ?? 0),
      phaseRad: radFromDeg(beam.phaseDeg ?? 0),
    })),
    operation: panel.operation,
    panel: siPanel(panel),
    illumination: siIllumination(design.illumination, siOutline(panel.outline, [0, 0])),
    synthesis: siSynthesis(design.synthesis),
    referencePhaseRad: referencePhaseDeg === 'search' ? 'search' : radFromDeg(referencePhaseDeg),
    receiveExponent: prediction.receiveExponent,
    radiateExponent: prediction.radiateExponent,
    ...(prediction.model === 'vector' ? { vectorModel: siVectorModel(design) } : {}),
  };
}

function siSynthesis(synthesis: DesignDocument['synthesis']): SiSynthesis {
  if (synthesis.kind === 'focus') return { kind: 'focus', point: siPosition(synthesis.pointMm) };
  return synthesis.kind === 'projections' ? { ...synthesis, goal: siGoal(synthesis.goal) } : synthesis;
}

function siGoal(goal: PatternGoal): SectorGoal | MaskGoal {
  if (goal.kind === 'mask') {
    return { kind: 'mask', peakLossDb: goal.peakLossDb, points: goal.points.map(([deg, levelDb]) => ({ offAxisRad: radFromDeg(deg), levelDb })) };
  }
  const span = ([from, to]: readonly [number, number]): [number, number] => [radFromDeg(from), radFromDeg(to)];
  const { sectors, rippleDb, transitionDeg, outsideDb } = goal;
  return {
    kind: 'sectors',
    sectors: sectors.map(({ azimuthDeg, elevationDeg }) => ({ azimuthRad: span(azimuthDeg), elevationRad: span(elevationDeg) })),
    rippleDb,
    transitionRad: radFromDeg(transitionDeg),
    outsideDb,
  };
}

function siVectorModel({ requirement, prediction }: DesignDocument): SiVectorModel {
  return { reradiation: prediction.reradiation ?? 'power-wave', cellFactor: prediction.cellFactor ?? 'none', polarisation: requirement.polarisation };
}

/** The panel alone in metres, for counting its cells before anything else is known. */
export function siPanel(panel: { outline: Outline; lattice: Lattice; keepOuts: readonly KeepOut[] }): SiPanel {
  return {
    outline: siOutline(panel.outline, [0, 0]),
    lattice:
      panel.lattice.kind === 'rectangular'
        ? { kind: 'rectangular', periodXM: panel.lattice.periodXMm * M_PER_MM, periodYM: panel.lattice.periodYMm * M_PER_MM }
        : { kind: 'triangular', periodXM: panel.lattice.periodXMm * M_PER_MM, rowSpacingM: panel.lattice.rowSpacingMm * M_PER_MM },
    keepOuts: panel.keepOuts.map((keepOut) => siOutline(keepOut, keepOut.centreMm)),
  };
}

function siOutline(outline: Outline, centreMm: readonly [number, number]): SiOutline {
  const [centreX, centreY] = centreMm;
  if (outline.kind === 'polygon') {
    const points = outline.pointsMm.map(([x, y]) => ({ xM: (x + centreX) * M_PER_MM, yM: (y + centreY) * M_PER_MM }));
    return { kind: 'polygon', points };
  }
  const centre = { xM: centreX * M_PER_MM, yM: centreY * M_PER_MM };
  return { kind: outline.kind, centre, widthM: outline.widthMm * M_PER_MM, heightM: outline.heightMm * M_PER_MM };
}

function siIllumination(illumination: DesignDocument['illumination'], outline: SiOutline): SiIllumination {
  if (illumination.kind === 'guided-wave') return siGuidedWave(illumination, outline);
  if (illumination.kind === 'plane-wave') {
    const source = directionOf(radFromDeg(illumination.thetaDeg), radFromDeg(illumination.phiDeg));
    return { kind: 'plane-wave', source, polarisation: illumination.polarisation };
  }
  const { exponentE, exponentH, polarisation, positionMm, aimMm, blockageRadiusMm } = illumination;
  const blockage = blockageRadiusMm === undefined ? {} : { blockageRadiusM: blockageRadiusMm * M_PER_MM };
  return { kind: 'horn', position: siPosition(positionMm), aim: siPosition(aimMm), exponentE, exponentH, polarisation, ...blockage };
}

function siGuidedWave(wave: Extract<DesignDocument['illumination'], { kind: 'guided-wave' }>, outline: SiOutline): SiGuidedWave {
  const { launch, effectiveIndex, leakageNpPerM, polarisation } = wave;
  const directionRad = launch.kind === 'plane' ? radFromDeg(launch.directionDeg) : 0;
  return {
    kind: 'guided-wave',
    launch:
      launch.kind === 'plane'
        ? { kind: 'plane', directionRad, feedEdgeM: feedEdgeM(outline, directionRad) }
        : { kind: 'radial', centre: { xM: launch.centreMm[0] * M_PER_MM, yM: launch.centreMm[1] * M_PER_MM }, radiusM: launch.radiusMm * M_PER_MM },
    effectiveIndex,
    leakageNpPerM,
    polarisation,
  };
}

function siPosition([x, y, z]: readonly [number, number, number]): SiPosition {
  return { xM: x * M_PER_MM, yM: y * M_PER_MM, zM: z * M_PER_MM };
}
