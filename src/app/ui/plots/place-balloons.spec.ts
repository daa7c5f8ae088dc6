import { BALLOON_R, placeBalloons } from './place-balloons';

const room = { width: 400, height: 300, obstacles: [] };

describe('balloons', () => {
  it('stand above a lone anchor', () => {
    expect(placeBalloons([{ name: '1', x: 200, y: 150 }], room)[0]).toMatchObject({ balloonX: 200, balloonY: 124 });
  });
  it('never cover each other, even for anchors in one place', () => {
    const placed = placeBalloons(['1', '2', '3', '4', '5'].map((name, i) => ({ name, x: 200 + i, y: 150 })), room);
    for (const one of placed) {
      for (const other of placed) {
        if (one !== other) expect(Math.hypot(one.balloonX - other.balloonX, one.balloonY - other.balloonY)).toBeGreaterThan(2 * BALLOON_R);
      }
    }
  });
  it('stay within the plot', () => {
    for (const { balloonX, balloonY } of placeBalloons([{ name: '1', x: 2, y: 2 }, { name: '2', x: 399, y: 299 }], room)) {
      expect(balloonX > BALLOON_R && balloonX < 400 - BALLOON_R && balloonY > BALLOON_R && balloonY < 300 - BALLOON_R).toBe(true);
    }
  });
  it('stay within the plot when the trace crowds every place in it', () => {
    const obstacles = Array.from({ length: 3000 }, (_, i) => ({ x: 150 + (i % 100), y: 10 * Math.floor(i / 100), r: 2 }));
    const [{ balloonY }] = placeBalloons([{ name: '1', x: 200, y: 20 }], { ...room, obstacles });
    expect(balloonY).toBeGreaterThan(BALLOON_R);
  });
  it('keep off obstacles and go away from the beam first', () => {
    const [placed] = placeBalloons([{ name: 'a', x: 150, y: 150 }], { ...room, awayFrom: { x: 200, y: 150 } });
    expect([placed.balloonX, placed.balloonY]).toEqual([124, 150]);
    const [moved] = placeBalloons([{ name: 'a', x: 150, y: 150 }], { ...room, awayFrom: { x: 200, y: 150 }, obstacles: [{ x: 124, y: 150, r: 10 }] });
    expect(Math.hypot(moved.balloonX - 124, moved.balloonY - 150)).toBeGreaterThan(10 + BALLOON_R);
  });
});
