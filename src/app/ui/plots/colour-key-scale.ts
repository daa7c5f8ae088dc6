import { niceStep, ticksBetween } from './axis-ticks';
import { colourMap, cssColour } from './colour-maps';
import type { ColourScale, ThemeName } from './colour-maps';
import { digitsOfStep, numberText, signedNumberText } from './plot-text';
import { escapeXml } from './plot-export';

export interface KeyTick {
  /** 0 at the left end, 1 at the right. */
  readonly at: number;
  readonly text: string;
  /** The place where a phase wraps. */
  readonly wrap: boolean;
}

/** The ticks of a colour key. Both ends of a phase are one value and say so. */
export function keyTicks(scale: ColourScale, atMost: number): readonly KeyTick[] {
  const { from, to, map } = scale;
  if (map === 'cyclic') {
    const quarter = (to - from) / 4;
    return [0, 1, 2, 3, 4].map((i) => ({ at: i / 4, text: i % 4 === 0 ? `±${numberText(to, 0)}` : numberText(from + i * quarter, 0), wrap: i % 4 === 0 }));
  }
  const step = niceStep(to - from, atMost);
  const digits = digitsOfStep(step);
  const write = map === 'diverging' ? signedNumberText : numberText;
  return ticksBetween(from, to, step).map((value) => ({ at: (value - from) / (to - from), text: write(value, digits), wrap: false }));
}

/** Colours at even places along the key. */
export function keyStops(scale: ColourScale, theme: ThemeName): readonly { readonly at: number; readonly colour: string }[] {
  const map = colourMap(scale.map, theme);
  const count = 32;
  return Array.from({ length: count + 1 }, (_, i) => ({ at: i / count, colour: cssColour(map, Math.round((255 * i) / count)) }));
}

/** A key for exported pictures, drawn with the values of a theme. */
export function keyMarkup(
  layer: { readonly title: string; readonly unit: string; readonly scale: ColourScale },
  theme: { readonly name: ThemeName; readonly ink: string; readonly muted: string; readonly ruleStrong: string },
  width: number,
): { readonly markup: string; readonly height: number } {
  const text = (x: number, y: number, content: string, anchor: string): string =>
    `<text x="${x}" y="${y}" style="font:400 11px 'IBM Plex Mono',monospace;fill:${theme.muted};text-anchor:${anchor}">${escapeXml(content)}</text>`;
  const stops = keyStops(layer.scale, theme.name).map(({ at, colour }) => `<stop offset="${at}" stop-color="${colour}"/>`).join('');
  const ticks = keyTicks(layer.scale, 6).map(({ at, text: label, wrap }) => {
    const x = Math.round(at * width * 10) / 10;
    return `<path d="M${x} ${wrap ? 14 : 24}V32" stroke="${theme.ink}" stroke-width="${wrap ? 2 : 1}"/>` + text(x, 44, label, 'middle');
  });
  const name = layer.unit === '' ? layer.title : `${layer.title}, ${layer.unit}`;
  const bar = `<rect x="0.5" y="16.5" width="${width - 1}" height="11" fill="url(#exported-key)" stroke="${theme.ruleStrong}"/>`;
  return { markup: `<defs><linearGradient id="exported-key">${stops}</linearGradient></defs>${text(0, 10, name, 'start')}${bar}${ticks.join('')}`, height: 48 };
}
