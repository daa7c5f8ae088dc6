import { nearestBranchRad } from '../../math/unwrap-phase';
import { hornAxis } from '../horn-field';
import { illuminateCells, type CellIllumination } from '../illumination';
import type { PlacedDesign } from '../place-cells';
import type { PreparedEdition } from '../prepare-edition';
import type { SiHorn, SiPosition } from '../si-design';
import { relitCells } from './moved-feed';

/** What a horn that stands elsewhere changes at every cell. */
export interface FeedShift {
  /** Adds the changes by a move of the horn; its aim stays, and so do the cells. */
  addChanges(move: SiPosition, phaseRad: Float64Array, logMagnitude: Float64Array): void;
  /** Moves along the horn's axis, away from its aim. */
  readonly backwards: SiPosition;
}

/** Changes for a step along one axis: first and second differences of ln amplitude (cell loss included) and of the cell's phase. */
interface AxisChange {
  readonly firstLog: Float64Array;
  readonly secondLog: Float64Array;
  readonly firstPhase: Float64Array;
  readonly secondPhase: Float64Array;
}

const AXES = ['xM', 'yM', 'zM'] as const;
/** Step of the differences over the distance of horn and aim. */
const STEP_SHARE = 0.01;
const LEAST = 1e-12;

/**
 * The path of every ray is exact. Amplitude and the response at the new incidence follow a parabola along each of x, y and z
 * through the horn's place and one step either way; what two moves change together beyond their sum is left out.
 */
export function feedShift(placed: PlacedDesign, horn: SiHorn, edition?: PreparedEdition): FeedShift {
  const { lattice, light } = placed;
  const wavenumber = placed.designWavenumber;
  const [bx, by, bz] = hornAxis(horn);
  const distanceM = Math.hypot(horn.position.xM - horn.aim.xM, horn.position.yM - horn.aim.yM, horn.position.zM - horn.aim.zM);
  const stepM = STEP_SHARE * distanceM;
  const axes = AXES.map((axis) => axisChange({ placed, horn, edition, axis, stepM }));
  const addChanges: FeedShift['addChanges'] = (move, phaseRad, logMagnitude) => {
    const place = moved(horn.position, move);
    for (let n = 0; n < lattice.count; n++) {
      const dx = lattice.xM[n] - place.xM;
      const dy = lattice.yM[n] - place.yM;
      phaseRad[n] -= wavenumber * (Math.sqrt(dx * dx + dy * dy + place.zM * place.zM) - light.pathM[n]);
    }
    AXES.forEach((axis, a) => {
      const t = move[axis] / stepM;
      if (t === 0) return;
      const { firstLog, secondLog, firstPhase, secondPhase } = axes[a];
      for (let n = 0; n < lattice.count; n++) {
        phaseRad[n] += t * (firstPhase[n] + t * secondPhase[n]);
        logMagnitude[n] += t * (firstLog[n] + t * secondLog[n]);
      }
    });
  };
  return { addChanges, backwards: { xM: -bx, yM: -by, zM: -bz } };
}

interface AxisQuery {
  readonly placed: PlacedDesign;
  readonly horn: SiHorn;
  readonly edition: PreparedEdition | undefined;
  readonly axis: (typeof AXES)[number];
  readonly stepM: number;
}

function axisChange({ placed, horn, edition, axis, stepM }: AxisQuery): AxisChange {
  const { lattice, light, si } = placed;
  const here = shiftedState(placed, light, edition);
  const [ahead, behind] = [stepM, -stepM].map((by) => {
    const position = { ...horn.position, [axis]: horn.position[axis] + by };
    return shiftedState(placed, illuminateCells({ ...horn, position }, lattice, si.receiveExponent), edition);
  });
  const near = (rad: number, n: number): number => nearestBranchRad(rad, here.phaseRad[n]) - here.phaseRad[n];
  return {
    firstLog: ahead.log.map((value, n) => (value - behind.log[n]) / 2),
    secondLog: ahead.log.map((value, n) => (value + behind.log[n]) / 2 - here.log[n]),
    firstPhase: ahead.phaseRad.map((value, n) => (near(value, n) - near(behind.phaseRad[n], n)) / 2),
    secondPhase: ahead.phaseRad.map((value, n) => (near(value, n) + near(behind.phaseRad[n], n)) / 2),
  };
}

/** ln amplitude with the cell's loss, and the cell's phase, under another light. */
function shiftedState(placed: PlacedDesign, light: CellIllumination, edition?: PreparedEdition): { log: Float64Array; phaseRad: Float64Array } {
  const { magnitude, phaseRad } = relitCells(placed, light, edition);
  return { phaseRad, log: light.amplitude.map((amplitude, n) => Math.log(Math.max(LEAST, amplitude)) + Math.log(Math.max(LEAST, magnitude[n]))) };
}

function moved(from: SiPosition, by: SiPosition): SiPosition {
  return { xM: from.xM + by.xM, yM: from.yM + by.yM, zM: from.zM + by.zM };
}
