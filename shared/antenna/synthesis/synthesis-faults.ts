import type { DesignDocument } from '../../model/design-document';
import type { DesignFault } from '../invalid-design';
import { latticeGrid } from '../panel-lattice';
import { siPanel } from '../si-design';

/** More blocks than this take longer to search than a person waits. */
const MOST_BLOCKS = 1024;

/** Faults between the fields of a target phase; blocks of cells are counted only on a panel whose shape is sound. */
export function synthesisFaults({ synthesis, panel }: DesignDocument, isShapeSound: boolean): DesignFault[] {
  if (synthesis.kind === 'focus' && synthesis.pointMm[2] <= 0) {
    return [{ pointer: '#/synthesis/pointMm/2', detail: `the focus must lie in front of the panel, z > 0; got z = ${synthesis.pointMm[2]} mm` }];
  }
  if (synthesis.kind === 'diffuse') return isShapeSound ? blockFaults(synthesis, panel) : [];
  return synthesis.kind === 'projections' ? goalFaults(synthesis.goal) : [];
}

function blockFaults(synthesis: Extract<DesignDocument['synthesis'], { kind: 'diffuse' }>, panel: DesignDocument['panel']): DesignFault[] {
  const { columnCount, rowCount } = latticeGrid(siPanel(panel));
  const blocks = Math.ceil(columnCount / synthesis.blockColumns) * Math.ceil(rowCount / synthesis.blockRows);
  return blocks <= MOST_BLOCKS ? [] : [{ pointer: '#/synthesis/blockColumns', detail: `makes ${blocks} blocks; the limit is ${MOST_BLOCKS}: take larger blocks` }];
}

function goalFaults(goal: Extract<DesignDocument['synthesis'], { kind: 'projections' }>['goal']): DesignFault[] {
  if (goal.kind === 'mask') {
    return goal.points.flatMap(([deg], i) =>
      i > 0 && deg <= goal.points[i - 1][0] ? [{ pointer: `#/synthesis/goal/points/${i}/0`, detail: `angles must rise; got ${deg} after ${goal.points[i - 1][0]}°` }] : [],
    );
  }
  return goal.sectors.flatMap((sector, i) =>
    (['azimuthDeg', 'elevationDeg'] as const).flatMap((name) => {
      const [from, to] = sector[name];
      return from < to ? [] : [{ pointer: `#/synthesis/goal/sectors/${i}/${name}/1`, detail: `must rise; got ${from} to ${to}°` }];
    }),
  );
}
