/** What a person waits for at a running product: from request to answer, and in a browser from the key to the painted strip. */
import { chromium } from 'playwright-core';

const cuts = ['along', 'across'].map((plane) => ({ plane, angleDeg: [-90, 90, 0.25] }));
const switches = ['--no-sandbox', '--disable-gpu', '--disable-quic', '--no-first-run', '--disable-background-networking', '--disable-component-update', '--disable-sync'];

/** A square panel of the beam's own cells, the horn moved with its size, steered a little further with every request. */
function steered(design, side, i) {
  const { requirement, panel, illumination } = design;
  const { periodXMm, periodYMm } = panel.lattice;
  const outline = { kind: 'rectangle', widthMm: side * periodXMm, heightMm: side * periodYMm };
  return {
    ...design,
    requirement: { ...requirement, beams: [{ thetaDeg: 10 + (i % 200) * 0.1, phiDeg: 0 }] },
    panel: { ...panel, outline, keepOuts: [] },
    illumination: { ...illumination, positionMm: [-0.35 * outline.widthMm, 0, 1.1 * outline.widthMm], aimMm: [0, 0, 0] },
  };
}

/** One preview after the other, as the client sends them. */
async function previews(product, side, count) {
  const { design } = await product.demoPanel('A, ');
  // The slipway wall is made of cells of a library edition at oblique incidence, of the same lattice.
  const cells = side === 40 ? { kind: 'ideal', levels: null } : (await product.demoPanel('B, ')).design.cells;
  const base = { ...design, cells };
  const headers = { accept: 'application/octet-stream', 'slantwise-preview': 'bench' };
  const times = [];
  for (let i = -5; i < count; i++) {
    const body = { design: steered(base, side, i + 5), include: ['cells', 'cuts', 'uv'], cuts, uvSize: 101 };
    const started = performance.now();
    await product.ask('POST', '/api/predictions', body, headers);
    if (i >= 0) times.push(performance.now() - started);
  }
  return times;
}

/** Runs in the page: from now on `benchPaint` promises the milliseconds from the next arrow key to the first frame with another figure in the strip. */
function watchPaint() {
  const figures = () => [...document.querySelectorAll('button .value b')].map((element) => element.textContent).join(' ');
  const before = figures();
  window.benchPaint = new Promise((resolve, reject) => {
    setTimeout(() => reject(new Error(`No figure of the strip has changed for a minute: ${before}`)), 60_000);
    let pressed = null;
    document.addEventListener('keydown', ({ key }) => key.startsWith('Arrow') && (pressed ??= performance.now()), { capture: true });
    const watch = new MutationObserver(() => {
      if (pressed === null || figures() === before) return;
      watch.disconnect();
      requestAnimationFrame(() => setTimeout(() => resolve(performance.now() - pressed)));
    });
    watch.observe(document.body, { subtree: true, childList: true, characterData: true });
  });
}

async function paints(product, count) {
  const { design } = await product.demoPanel('A, ');
  const { id: projectId } = (await product.ask('POST', '/api/projects', { name: 'Bench' })).json();
  const panel = (await product.ask('POST', `/api/projects/${projectId}/panels`, { name: 'Bench', design: steered({ ...design, cells: { kind: 'ideal', levels: null } }, 40, 0) })).json();
  const browser = await chromium.launch({ executablePath: '/usr/bin/chromium', args: switches });
  try {
    const page = await (await browser.newContext({ baseURL: product.address, viewport: { width: 1440, height: 900 } })).newPage();
    await page.context().request.post('/api/session', { data: product.credentials });
    await page.goto(`/panels/${panel.id}/pattern`);
    await page.getByRole('button', { name: /^Gain at the peak/ }).waitFor();
    await page.getByLabel('Beam θ').focus();
    const times = [];
    for (let i = -5; i < count; i++) {
      await page.evaluate(watchPaint);
      // A whole degree, to and fro, so that some figure changes in the digits that are shown.
      await page.keyboard.press(i % 20 < 10 ? 'Shift+ArrowUp' : 'Shift+ArrowDown');
      const ms = await page.evaluate(() => window.benchPaint);
      if (i >= 0) times.push(ms);
      await page.waitForTimeout(150);
    }
    return times;
  } finally {
    await browser.close();
  }
}

export const rows = [
  { name: 'preview over HTTP, 40 x 40', goal: { p95Ms: 60 }, sample: (product) => previews(product, 40, 80) },
  { name: 'preview over HTTP, 100 x 100 of a library edition', goal: { p95Ms: 150 }, sample: (product) => previews(product, 100, 40) },
  { name: 'from key to painted strip, 40 x 40', goal: { p95Ms: 100 }, sample: (product) => paints(product, 40) },
];
