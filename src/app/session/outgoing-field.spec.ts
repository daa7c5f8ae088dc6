import { STARTING_DESIGN } from '../../../shared/model/starting-design';
import { outgoingField } from './outgoing-field';

const phaseOf = (re: number, im: number): number => (Math.atan2(im, re) * 180) / Math.PI;

describe('wave sent out by a panel, sampled above it', () => {
  // Over the middle of the panel, within its projected tube: the collimated region of the starting design.
  const grid = { fromXM: -0.02, fromZM: 0.06, stepM: 0.004, columns: 31, rows: 31 };
  const field = outgoingField(STARTING_DESIGN, grid);

  it('keeps nearly one phase along the beam once the carrier is off, as a collimated wave does', () => {
    const phases: number[] = [];
    for (let row = 0; row < grid.rows; row++) {
      // Follow the beam at 20 degrees from the middle of the panel.
      const zM = grid.fromZM + row * grid.stepM;
      const column = Math.round((zM * Math.tan((20 * Math.PI) / 180) - grid.fromXM) / grid.stepM);
      if (column < grid.columns) phases.push(phaseOf(field.real[row * grid.columns + column], field.imaginary[row * grid.columns + column]));
    }
    const middle = phases[Math.floor(phases.length / 2)];
    const spread = Math.max(...phases.map((phase) => Math.abs(((phase - middle + 540) % 360) - 180)));
    // Fresnel ripple of an aperture 19 wavelengths wide with a tapered edge stays within a sixteenth of a turn or so.
    expect(phases.length).toBeGreaterThan(20);
    expect(spread).toBeLessThan(25);
  });

  it('is far weaker beside the tube of the beam than within it', () => {
    const beside = outgoingField(STARTING_DESIGN, { fromXM: -0.16, fromZM: 0.2, stepM: 0.004, columns: 3, rows: 3 });
    expect(beside.largest / field.largest).toBeLessThan(0.25);
  });
});
