import type { CrestLines } from './crest-lines';
import type { SectionScale } from './section-drawing';

/** Over this many pixels the crests fade towards the edge of the picture. */
const FADE = 170;

/** Strokes the crests in one colour; their weight and strength follow the amplitude. */
export function paintCrests(canvas: HTMLCanvasElement, crests: CrestLines, scale: SectionScale): void {
  const density = window.devicePixelRatio || 1;
  canvas.width = Math.round(scale.width * density);
  canvas.height = Math.round(scale.height * density);
  const context = canvas.getContext('2d');
  if (context === null) return;
  context.scale(density, density);
  context.strokeStyle = getComputedStyle(canvas).color;
  const perM = scale.pixelsPerMm * 1000;
  for (let n = 0; n < crests.count; n++) {
    const [fromX, fromZ, toX, toZ, amplitude] = crests.pieces.subarray(5 * n, 5 * n + 5);
    const x = scale.originX + fromX * perM;
    const y = scale.originY - fromZ * perM;
    const strength = strengthAt(amplitude, edgeFade(scale, x, y));
    if (strength < 0.01) continue;
    context.globalAlpha = strength;
    context.lineWidth = 0.7 + 1.1 * Math.min(1, amplitude * 1.6);
    context.beginPath();
    context.moveTo(x, y);
    context.lineTo(scale.originX + toX * perM, scale.originY - toZ * perM);
    context.stroke();
  }
}

/** Weak parts of the wave stay visible as a breath, strong parts are nearly solid. */
export function strengthAt(amplitude: number, fade: number): number {
  const level = Math.min(1, amplitude * 1.6);
  return (0.16 + 0.84 * level) * (amplitude < 0.12 ? 0.45 : 1) * fade;
}

export function edgeFade({ width }: SectionScale, x: number, y: number): number {
  const clamp = (value: number): number => Math.max(0, Math.min(1, value));
  return clamp((width - x) / FADE) * clamp(x / (FADE / 2)) * Math.max(0.25, clamp(y / (FADE / 2)));
}
