/** Copper of one cell, centred in it, in mm; `hole` takes copper away from what was drawn before. */
export type CopperShape =
  | { readonly kind: 'rectangle'; readonly widthMm: number; readonly heightMm: number; readonly hole: boolean }
  | { readonly kind: 'ring'; readonly outerMm: number; readonly stripMm: number }
  | { readonly kind: 'disc'; readonly diameterMm: number; readonly hole: boolean };

/** Thinner strips than this vanish on a screen. */
const THINNEST_PX = 0.9;

export interface ShapePlace {
  readonly xPx: number;
  readonly yPx: number;
  readonly pxPerMm: number;
}

export interface ShapeInk {
  readonly copper: string;
  /** What shows through a hole. */
  readonly ground: string;
}

/** Draws the copper of one cell. */
export function drawCopper(context: CanvasRenderingContext2D, shapes: readonly CopperShape[], place: ShapePlace, ink: ShapeInk): void {
  const { xPx, yPx, pxPerMm } = place;
  for (const shape of shapes) {
    switch (shape.kind) {
      case 'rectangle': {
        const [w, h] = [shape.widthMm * pxPerMm, shape.heightMm * pxPerMm];
        context.fillStyle = shape.hole ? ink.ground : ink.copper;
        context.fillRect(xPx - w / 2, yPx - h / 2, w, h);
        break;
      }
      case 'ring': {
        const strip = shape.stripMm * pxPerMm;
        const middle = shape.outerMm * pxPerMm - strip;
        context.strokeStyle = ink.copper;
        context.lineWidth = Math.max(strip, THINNEST_PX);
        context.strokeRect(xPx - middle / 2, yPx - middle / 2, middle, middle);
        break;
      }
      case 'disc':
        context.fillStyle = shape.hole ? ink.ground : ink.copper;
        context.beginPath();
        context.arc(xPx, yPx, (shape.diameterMm * pxPerMm) / 2, 0, 2 * Math.PI);
        context.fill();
    }
  }
}

/** One shape as SVG path data about a centre; a ring is two squares for the even-odd rule. */
export function copperPath(shape: CopperShape, place: ShapePlace): string {
  switch (shape.kind) {
    case 'rectangle':
      return boxPath(place, shape.widthMm, shape.heightMm);
    case 'ring':
      return boxPath(place, shape.outerMm, shape.outerMm) + boxPath(place, shape.outerMm - 2 * shape.stripMm, shape.outerMm - 2 * shape.stripMm);
    case 'disc': {
      const r = (shape.diameterMm * place.pxPerMm) / 2;
      return `M${tidy(place.xPx - r)} ${tidy(place.yPx)}a${tidy(r)} ${tidy(r)} 0 1 0 ${tidy(2 * r)} 0a${tidy(r)} ${tidy(r)} 0 1 0 ${tidy(-2 * r)} 0Z`;
    }
  }
}

function boxPath({ xPx, yPx, pxPerMm }: ShapePlace, widthMm: number, heightMm: number): string {
  const [w, h] = [widthMm * pxPerMm, heightMm * pxPerMm];
  return `M${tidy(xPx - w / 2)} ${tidy(yPx - h / 2)}h${tidy(w)}v${tidy(h)}h${tidy(-w)}Z`;
}

function tidy(value: number): number {
  return Math.round(value * 1000) / 1000;
}
