type Point = readonly [number, number];

/** Why the points enclose no proper area, or undefined: repeated points, edges that cross or touch, no area. */
export function polygonFault(points: readonly Point[]): string | undefined {
  const size = Math.max(...points.map(([x]) => x)) - Math.min(...points.map(([x]) => x));
  const height = Math.max(...points.map(([, y]) => y)) - Math.min(...points.map(([, y]) => y));
  const slack = 1e-9 * Math.max(size, height);
  for (let i = 0; i < points.length; i++) {
    const next = points[(i + 1) % points.length];
    if (Math.hypot(points[i][0] - next[0], points[i][1] - next[1]) <= slack) {
      return `points ${i} and ${(i + 1) % points.length} are the same`;
    }
  }
  const crossing = firstCrossing(points);
  if (crossing) return `the outline crosses itself: the edges from points ${crossing[0]} and ${crossing[1]} meet`;
  return Math.abs(twiceArea(points)) <= slack * slack ? 'the points lie on one line and enclose no area' : undefined;
}

function firstCrossing(points: readonly Point[]): [number, number] | undefined {
  const count = points.length;
  for (let i = 0; i < count; i++) {
    for (let j = i + 1; j < count; j++) {
      const adjacent = j === i + 1 || (i === 0 && j === count - 1);
      const a: Segment = [points[i], points[(i + 1) % count]];
      const b: Segment = [points[j], points[(j + 1) % count]];
      if (adjacent ? foldsBack(a, b, j === i + 1) : meet(a, b)) return [i, j];
    }
  }
  return undefined;
}

type Segment = readonly [Point, Point];

const turn = (a: Point, b: Point, c: Point): number => (b[0] - a[0]) * (c[1] - a[1]) - (b[1] - a[1]) * (c[0] - a[0]);

const within = (a: Point, b: Point, p: Point): boolean =>
  Math.min(a[0], b[0]) <= p[0] && p[0] <= Math.max(a[0], b[0]) && Math.min(a[1], b[1]) <= p[1] && p[1] <= Math.max(a[1], b[1]);

function meet([a, b]: Segment, [c, d]: Segment): boolean {
  const [s1, s2, s3, s4] = [turn(a, b, c), turn(a, b, d), turn(c, d, a), turn(c, d, b)];
  if (s1 * s2 < 0 && s3 * s4 < 0) return true;
  return (s1 === 0 && within(a, b, c)) || (s2 === 0 && within(a, b, d)) || (s3 === 0 && within(c, d, a)) || (s4 === 0 && within(c, d, b));
}

/** Neighbouring edges share a point; they overlap only where the second runs back along the first. */
function foldsBack(a: Segment, b: Segment, inOrder: boolean): boolean {
  const [first, second] = inOrder ? [a, b] : [b, a];
  if (turn(first[0], first[1], second[1]) !== 0) return false;
  const [p, q, r] = [first[0], first[1], second[1]];
  return (q[0] - p[0]) * (r[0] - q[0]) + (q[1] - p[1]) * (r[1] - q[1]) < 0;
}

function twiceArea(points: readonly Point[]): number {
  return points.reduce((sum, [x, y], i) => {
    const [nextX, nextY] = points[(i + 1) % points.length];
    return sum + x * nextY - nextX * y;
  }, 0);
}
