/** Whole predictions, as the engine answers them: what a person waits for while steering, less the way to the browser. */

function steering(load, side, { uv }) {
  const { predictDesign } = load('antenna/predict-design');
  const { STARTING_DESIGN } = load('model/starting-design');
  const sideMm = side * 5;
  const scale = sideMm / 200;
  const { requirement, panel, illumination } = STARTING_DESIGN;
  const design = (thetaDeg) => ({
    ...STARTING_DESIGN,
    requirement: { ...requirement, beams: [{ thetaDeg, phiDeg: 0 }] },
    panel: { ...panel, outline: { kind: 'rectangle', widthMm: sideMm, heightMm: sideMm } },
    // The horn moves back with the size of the panel, so that it lights every size alike.
    illumination: { ...illumination, positionMm: illumination.positionMm.map((mm) => mm * scale) },
  });
  const cuts = ['along', 'across'].map((plane) => ({ plane, angleDeg: [-90, 90, 0.25] }));
  const include = { cells: true, cuts, ...(uv ? { uv: { size: uv } } : {}) };
  return (i) => predictDesign(design(10 + (i % 200) * 0.1), { include });
}

export const rows = [
  {
    name: 'a panel of 10⁶ cells, placed and predicted',
    goal: { wallMs: 2000, rssMb: 600 },
    prepare: (load) => ({ work: () => steering(load, 1000, { uv: 0 })(0) }),
  },
  { name: 'steering preview, 40 x 40', goal: { p95Ms: 60, calls: 100 }, prepare: (load) => ({ work: steering(load, 40, { uv: 101 }) }) },
  { name: 'steering preview, 100 x 100', goal: { p95Ms: 150, calls: 30 }, prepare: (load) => ({ work: steering(load, 100, { uv: 101 }) }) },
];
