import type { MaskEnvelope } from '../../../../shared/antenna/masks/mask-envelope';
import type { DesignDocument } from '../../../../shared/model/design-document';
import type { CutFigure, CutMark } from '../../ui/plots/cut-figure';
import { numberText } from '../../ui/plots/plot-text';
import type { ShownCut } from './beam-cut';
import { forbiddenEdges } from './mask-level';

export type LevelForm = 'absolute' | 'relative';

export interface CutFigureSource {
  readonly title: string;
  readonly cut: ShownCut;
  readonly design: DesignDocument;
  /** Null where none is to be drawn. */
  readonly mask: MaskEnvelope | null;
  /** Of the lobe of the wanted beam on this cut. */
  readonly peakDbi: number;
  readonly form: LevelForm;
  /** How far below the peak the plot reaches, in dB, positive. */
  readonly depthDb: number;
  readonly parent: { readonly label: string; readonly cut: ShownCut; readonly peakDbi: number } | null;
  readonly marks: readonly CutMark[];
  /** Whether the cross-polar curve is drawn where there is one. */
  readonly showCross: boolean;
}

/** The figure of a cut, in dBi or relative to the peak of its beam. */
export function patternCutFigure(source: CutFigureSource): CutFigure {
  const { cut, design, peakDbi, form, parent } = source;
  const relative = form === 'relative';
  const shiftDb = relative ? peakDbi : 0;
  const shifted = (levels: ArrayLike<number>, by: number): ArrayLike<number> => (by === 0 ? levels : Float64Array.from(levels, (level) => level - by));
  const { minGainDbi, beams } = design.requirement;
  const top = Math.ceil(((relative ? 0 : peakDbi) + 3) / 10) * 10;
  const lowest = (relative ? 0 : peakDbi) - source.depthDb;
  return {
    title: source.title,
    angleTitle: cut.angleTitle,
    levelTitle: relative ? 'gain relative to the peak, dB' : 'gain, dBi',
    main: { label: cut.crossGainDbi ? 'draft, co-polar' : 'draft', angleDeg: cut.angleDeg, levelDb: shifted(cut.gainDbi, shiftDb) },
    ...(source.showCross && cut.crossGainDbi ? { cross: { label: 'cross-polar', angleDeg: cut.angleDeg, levelDb: shifted(cut.crossGainDbi, shiftDb) } } : {}),
    overlay: parent ? { label: parent.label, angleDeg: parent.cut.angleDeg, levelDb: shifted(parent.cut.gainDbi, relative ? parent.peakDbi : 0) } : null,
    forbidden: forbiddenEdges(source.mask, beams, cut, shiftDb),
    forbiddenLabel: 'forbidden by the mask',
    least: minGainDbi === undefined ? null : { label: `least gain, ${numberText(minGainDbi, 1)} dBi`, angleDeg: cut.beamDeg, levelDb: minGainDbi - shiftDb },
    marks: source.marks.map((mark) => ({ ...mark, levelDb: mark.levelDb - shiftDb })),
    fromDeg: -90,
    toDeg: 90,
    floorDb: Math.floor(lowest / 10) * 10,
    topDb: Math.max(top, Math.floor(lowest / 10) * 10 + 20),
  };
}
