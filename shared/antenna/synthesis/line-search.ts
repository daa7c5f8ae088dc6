const GOLDEN = (Math.sqrt(5) - 1) / 2;

/** Place of the maximum of a function with one top in the bracket, to 1e-9 of the bracket's far end. */
export function highestNear(level: (s: number) => number, from: number, to: number): number {
  let [low, high] = [from, to];
  let [left, right] = [high - GOLDEN * (high - low), low + GOLDEN * (high - low)];
  let [leftLevel, rightLevel] = [level(left), level(right)];
  while (high - low > 1e-9 * Math.abs(to)) {
    if (leftLevel < rightLevel) {
      [low, left, leftLevel] = [left, right, rightLevel];
      right = low + GOLDEN * (high - low);
      rightLevel = level(right);
    } else {
      [high, right, rightLevel] = [right, left, leftLevel];
      left = high - GOLDEN * (high - low);
      leftLevel = level(left);
    }
  }
  return (low + high) / 2;
}

/** Where a function falls through a level between a place above it and one below, by halving. */
export function fallingEdge(level: (s: number) => number, wanted: number, above: number, below: number): number {
  let [inside, outside] = [above, below];
  for (let i = 0; i < 60 && Math.abs(outside - inside) > 1e-9 * Math.abs(outside); i++) {
    const middle = (inside + outside) / 2;
    if (level(middle) > wanted) inside = middle;
    else outside = middle;
  }
  return (inside + outside) / 2;
}
