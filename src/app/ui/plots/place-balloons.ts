export interface BalloonAnchor {
  readonly name: string;
  readonly x: number;
  readonly y: number;
}

export interface PlacedBalloon extends BalloonAnchor {
  readonly balloonX: number;
  readonly balloonY: number;
}

export interface BalloonRoom {
  readonly width: number;
  readonly height: number;
  /** Circles that balloons keep off. */
  readonly obstacles: readonly { readonly x: number; readonly y: number; readonly r: number }[];
  /** Balloons go away from here first. */
  readonly awayFrom?: { readonly x: number; readonly y: number };
}

export const BALLOON_R = 8.5;
const GAP = 4;
const REACHES = [26, 38, 54, 74];
const FURTHEST = REACHES[REACHES.length - 1];
const TURNS = 16;
/** Dearer than any crowd: a balloon outside the plot is not seen at all. */
const OUTSIDE = 1e6;

/** Gives each anchor a balloon beside it that covers neither another balloon nor an obstacle, as near as that can be had. */
export function placeBalloons(anchors: readonly BalloonAnchor[], room: BalloonRoom): readonly PlacedBalloon[] {
  const taken = [...room.obstacles, ...anchors.map(({ x, y }) => ({ x, y, r: 4 }))];
  return anchors.map((anchor) => {
    const near = taken.filter(({ x, y, r }) => Math.hypot(x - anchor.x, y - anchor.y) < FURTHEST + BALLOON_R + r + GAP);
    const priced = candidates(anchor, room).map((spot) => ({ ...spot, cost: cost(spot, anchor, near, room) }));
    const best = priced.reduce((a, b) => (b.cost < a.cost ? b : a));
    taken.push({ x: best.x, y: best.y, r: BALLOON_R });
    return { ...anchor, balloonX: best.x, balloonY: best.y };
  });
}

interface Spot {
  readonly x: number;
  readonly y: number;
  readonly turned: number;
  readonly reach: number;
}

function candidates(anchor: BalloonAnchor, { awayFrom }: BalloonRoom): readonly Spot[] {
  const away = awayFrom && Math.hypot(anchor.x - awayFrom.x, anchor.y - awayFrom.y) > 1;
  const first = away ? Math.atan2(anchor.y - awayFrom.y, anchor.x - awayFrom.x) : -Math.PI / 2;
  return REACHES.flatMap((reach) =>
    Array.from({ length: TURNS }, (_, i) => {
      const turned = (((i + 1) >> 1) * (i % 2 === 0 ? 1 : -1) * 2 * Math.PI) / TURNS;
      const angle = first + turned;
      return { x: Math.round((anchor.x + reach * Math.cos(angle)) * 10) / 10, y: Math.round((anchor.y + reach * Math.sin(angle)) * 10) / 10, turned: Math.abs(turned), reach };
    }),
  );
}

function cost(spot: Spot, anchor: BalloonAnchor, taken: BalloonRoom['obstacles'], { width, height }: BalloonRoom): number {
  let total = spot.reach / 10 + 3 * spot.turned;
  const edge = BALLOON_R + 1;
  if (spot.x < edge || spot.y < edge || spot.x > width - edge || spot.y > height - edge) total += OUTSIDE;
  for (const { x, y, r } of taken) {
    const isOwn = x === anchor.x && y === anchor.y;
    const overlap = BALLOON_R + r + GAP - Math.hypot(spot.x - x, spot.y - y);
    if (!isOwn && overlap > 0) total += 20 + 8 * overlap;
  }
  return total;
}
