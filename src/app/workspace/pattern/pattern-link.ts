import type { ParamMap, Params } from '@angular/router';
import type { CutWindow } from '../../ui/plots/cut-plot-drawing';
import type { CutChoice } from './beam-cut';
import type { LevelForm } from './pattern-cut-figure';

/** What may be switched off and on. */
export interface PatternShow {
  readonly parent: boolean;
  readonly mask: boolean;
  readonly lobes: boolean;
  readonly specular: boolean;
  readonly cross: boolean;
}

/** What the address of the sheet says of the view, so that a link shows the same. */
export interface PatternLink {
  readonly cut: CutChoice;
  readonly planePhiDeg: number;
  readonly form: LevelForm;
  /** Which field the map of the hemisphere shows. */
  readonly field: 'co' | 'cross';
  /** How far below the peak map and cut reach, in dB, positive. */
  readonly depthDb: number;
  readonly show: PatternShow;
  /** Which of the beams has the handle, counted from 0. */
  readonly beam: number;
  /** Markers set by hand. */
  readonly marksDeg: readonly number[];
  readonly window: CutWindow | null;
  /** The polar form takes the whole width. */
  readonly polarWide: boolean;
}

export const DEEPEST_DB = 100;
export const SHALLOWEST_DB = 10;

const FIRST_SHOW: PatternShow = { parent: true, mask: true, lobes: true, specular: false, cross: true };
const SHOW_NAMES = ['parent', 'mask', 'lobes', 'specular', 'cross'] as const;

export function readPatternLink(query: ParamMap): PatternLink {
  const cut = query.get('cut');
  return {
    cut: cut === 'across' || cut === 'plane' ? cut : 'along',
    planePhiDeg: numberIn(query.get('phi'), { from: -360, to: 360, otherwise: 45 }),
    form: query.get('level') === 'relative' ? 'relative' : 'absolute',
    field: query.get('field') === 'cross' ? 'cross' : 'co',
    depthDb: numberIn(query.get('floor'), { from: SHALLOWEST_DB, to: DEEPEST_DB, otherwise: 50 }),
    show: readShow(query.get('show')),
    beam: Math.round(numberIn(query.get('beam'), { from: 1, to: 32, otherwise: 1 })) - 1,
    marksDeg: (query.get('marks') ?? '').split('_').filter((part) => part !== '').map(Number).filter((angle) => Math.abs(angle) <= 180),
    window: readWindow(query.get('window')),
    polarWide: query.get('polar') === 'wide',
  };
}

function numberIn(text: string | null, { from, to, otherwise }: { readonly from: number; readonly to: number; readonly otherwise: number }): number {
  const value = text === null || text === '' ? Number.NaN : Number(text);
  return value >= from && value <= to ? value : otherwise;
}

function readShow(text: string | null): PatternShow {
  if (text === null) return FIRST_SHOW;
  const on = new Set(text.split('_'));
  return { parent: on.has('parent'), mask: on.has('mask'), lobes: on.has('lobes'), specular: on.has('specular'), cross: on.has('cross') };
}

function readWindow(text: string | null): CutWindow | null {
  const [fromDeg, toDeg, floorDb, topDb] = (text ?? '').split('_').map(Number);
  return fromDeg < toDeg && floorDb < topDb ? { fromDeg, toDeg, floorDb, topDb } : null;
}

/** Inverse of {@link readPatternLink}; null takes a part out of the address. */
export function writePatternLink(link: PatternLink): Params {
  const short = (value: number): string => String(Number(value.toPrecision(6)));
  const { window, show } = link;
  const sameShow = SHOW_NAMES.every((name) => show[name] === FIRST_SHOW[name]);
  return {
    cut: link.cut === 'along' ? null : link.cut,
    phi: link.planePhiDeg === 45 ? null : String(link.planePhiDeg),
    level: link.form === 'absolute' ? null : 'relative',
    field: link.field === 'co' ? null : 'cross',
    floor: link.depthDb === 50 ? null : String(link.depthDb),
    show: sameShow ? null : SHOW_NAMES.filter((name) => show[name]).join('_') || 'nothing',
    beam: link.beam === 0 ? null : String(link.beam + 1),
    marks: link.marksDeg.length === 0 ? null : link.marksDeg.map(String).join('_'),
    window: window ? [window.fromDeg, window.toDeg, window.floorDb, window.topDb].map(short).join('_') : null,
    polar: link.polarWide ? 'wide' : null,
  };
}
