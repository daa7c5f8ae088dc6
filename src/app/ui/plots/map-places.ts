/** Where the cells of a map lie: row by row from the lowest y, within a row from the lowest x. */
export interface MapPlaces {
  readonly xMm: ArrayLike<number>;
  readonly yMm: ArrayLike<number>;
  /** Size of one cell. */
  readonly pitchXMm: number;
  readonly pitchYMm: number;
}

export interface MapExtent {
  readonly fromXMm: number;
  readonly toXMm: number;
  readonly fromYMm: number;
  readonly toYMm: number;
}

export type MapStep = 'left' | 'right' | 'up' | 'down' | 'row-start' | 'row-end' | 'page-up' | 'page-down';

const PAGE_ROWS = 10;

/** Finds cells by place and by neighbourhood, on any lattice that is made of rows. */
export class PlaceIndex {
  /** First cell of each row; one past the last cell at the end. */
  private readonly rowStart: Int32Array;
  readonly rowCount: number;
  readonly extent: MapExtent;

  constructor(readonly places: MapPlaces) {
    const { xMm, yMm, pitchXMm, pitchYMm } = places;
    const starts: number[] = [];
    let [lowX, highX] = [Infinity, -Infinity];
    for (let i = 0; i < xMm.length; i++) {
      if (i === 0 || Math.abs(yMm[i] - yMm[i - 1]) > pitchYMm / 100) starts.push(i);
      lowX = Math.min(lowX, xMm[i]);
      highX = Math.max(highX, xMm[i]);
    }
    this.rowCount = starts.length;
    this.rowStart = Int32Array.from([...starts, xMm.length]);
    const some = xMm.length > 0;
    this.extent = {
      fromXMm: some ? lowX - pitchXMm / 2 : 0,
      toXMm: some ? highX + pitchXMm / 2 : 0,
      fromYMm: some ? yMm[0] - pitchYMm / 2 : 0,
      toYMm: some ? yMm[yMm.length - 1] + pitchYMm / 2 : 0,
    };
  }

  /** The cell that covers a point, or -1 where there is none. */
  cellAt(xMm: number, yMm: number): number {
    const { places } = this;
    if (places.xMm.length === 0) return -1;
    const row = this.rowNear(yMm);
    if (Math.abs(this.rowYMm(row) - yMm) > places.pitchYMm / 2) return -1;
    const cell = this.nearestInRow(row, xMm);
    return Math.abs(places.xMm[cell] - xMm) > places.pitchXMm / 2 ? -1 : cell;
  }

  /** The cell a key leads to; the same one at the edge. */
  step(cell: number, step: MapStep): number {
    const row = this.rowOf(cell);
    const [start, end] = [this.rowStart[row], this.rowStart[row + 1] - 1];
    switch (step) {
      case 'left':
        return Math.max(start, cell - 1);
      case 'right':
        return Math.min(end, cell + 1);
      case 'row-start':
        return start;
      case 'row-end':
        return end;
      case 'up':
        return this.cellInRow(row + 1, cell);
      case 'down':
        return this.cellInRow(row - 1, cell);
      case 'page-up':
        return this.cellInRow(row + PAGE_ROWS, cell);
      case 'page-down':
        return this.cellInRow(row - PAGE_ROWS, cell);
    }
  }

  /** The cells whose centre lies in a rectangle, in their order. */
  cellsWithin(area: MapExtent): Int32Array {
    const { xMm } = this.places;
    const found: number[] = [];
    for (let row = 0; row < this.rowCount; row++) {
      const y = this.rowYMm(row);
      if (y < area.fromYMm || y > area.toYMm) continue;
      for (let cell = this.rowStart[row]; cell < this.rowStart[row + 1]; cell++) {
        if (xMm[cell] >= area.fromXMm && xMm[cell] <= area.toXMm) found.push(cell);
      }
    }
    return Int32Array.from(found);
  }

  private cellInRow(row: number, from: number): number {
    const inside = Math.max(0, Math.min(this.rowCount - 1, row));
    return inside === this.rowOf(from) ? from : this.nearestInRow(inside, this.places.xMm[from]);
  }

  private rowYMm(row: number): number {
    return this.places.yMm[this.rowStart[row]];
  }

  private rowOf(cell: number): number {
    let [low, high] = [0, this.rowCount - 1];
    while (low < high) {
      const middle = (low + high + 1) >> 1;
      if (this.rowStart[middle] <= cell) low = middle;
      else high = middle - 1;
    }
    return low;
  }

  private rowNear(yMm: number): number {
    const above = lowest(this.rowCount, (row) => this.rowYMm(row) >= yMm);
    if (above === 0) return 0;
    if (above === this.rowCount) return above - 1;
    return this.rowYMm(above) - yMm < yMm - this.rowYMm(above - 1) ? above : above - 1;
  }

  private nearestInRow(row: number, xMm: number): number {
    const start = this.rowStart[row];
    const count = this.rowStart[row + 1] - start;
    const { xMm: all } = this.places;
    const above = start + lowest(count, (i) => all[start + i] >= xMm);
    if (above === start) return start;
    if (above === start + count) return above - 1;
    return all[above] - xMm < xMm - all[above - 1] ? above : above - 1;
  }
}

/** The first of `count` ordered items that holds; `count` when none does. */
function lowest(count: number, holds: (i: number) => boolean): number {
  let [low, high] = [0, count];
  while (low < high) {
    const middle = (low + high) >> 1;
    if (holds(middle)) high = middle;
    else low = middle + 1;
  }
  return low;
}
