import type { NoFigure } from '../../model/figures';
import { noFigure } from '../no-figure';
import { EVERY_DIRECTION, type MaskFacts, type MaskRule, type MaskSegment } from './mask-segment';

/*
 * Envelopes that others have published, each with its edition, its formula and how far its text was checked. Angles are
 * degrees off the beam and levels dBi, as in the texts. D is the largest dimension of the panel: the strictest reading
 * for an aperture that is not round.
 */

export interface PublishedMask {
  readonly id: string;
  readonly title: string;
  readonly edition: string;
  /** One line each. */
  readonly formula: readonly string[];
  /** Where the text says nothing. */
  readonly undefinedWhere: string;
  readonly ruleText: string;
  /** Frequencies it is written for. */
  readonly appliesTo: string;
  readonly source: string;
  /** How far the text was checked. */
  readonly status: string;
  readonly rule: MaskRule;
  readonly segments: (facts: MaskFacts) => readonly MaskSegment[] | NoFigure;
}

type Range = readonly [lowGHz: number, highGHz: number];

const FCC_RULE: MaskRule = { kind: 'allowance', excessDb: 3, angleFraction: 0.1, fromDeg: 7, toDeg: 180, spilloverDb: 6 };
const FCC_RULE_TEXT =
  'From 7° on the gain may exceed the envelope by up to 3 dB in 10 % of the angles, and by up to 6 dB in the spillover region of the main reflector where one is declared. The text asks for the plane tangent to the geostationary arc; here the highest level of every plane at each angle is judged, which is stricter.';

const constant = (level: number) => (): number => level;
/** a - 25 log phi. */
const falling = (a: number) => (phi: number): number => a - 25 * Math.log10(phi);

/** phi_min of S.465-6: max(1, 100 lambda/D) for D/lambda >= 50, max(2, 114 (D/lambda)^-1.09) below, in degrees. */
export function firstAngleOfS465Deg(apertureOverWavelength: number): number {
  return apertureOverWavelength >= 50 ? Math.max(1, 100 / apertureOverWavelength) : Math.max(2, 114 * apertureOverWavelength ** -1.09);
}

function s465(facts: MaskFacts): readonly MaskSegment[] | NoFigure {
  const first = firstAngleOfS465Deg(facts.apertureOverWavelength);
  if (first >= 48) return tooSmall(facts, 'its smallest angle passes 48°');
  return outsideOf('S.465-6', facts.frequencyHz, [[2, 31]]) ?? [
    { fromDeg: first, toDeg: 48, levelDb: falling(32) },
    { fromDeg: 48, toDeg: 180, levelDb: constant(-10) },
  ];
}

function s580(facts: MaskFacts): readonly MaskSegment[] | NoFigure {
  const { apertureOverWavelength } = facts;
  if (apertureOverWavelength < 50) return tooSmall(facts, 'the text is for D/λ of at least 50');
  return outsideOf('S.580-6', facts.frequencyHz, [[2, 31]]) ?? [
    { fromDeg: Math.max(1, 100 / apertureOverWavelength), toDeg: 20, levelDb: falling(29) },
    { fromDeg: 20 + 1e-9, toDeg: 26.3, levelDb: constant(-3.5) },
    { fromDeg: 26.3 + 1e-9, toDeg: 48, levelDb: falling(32) },
    { fromDeg: 48, toDeg: 180, levelDb: constant(-10) },
  ];
}

/** The whole reference pattern of F.699, main lobe included: level in dBi at any angle, for checks and drawings. */
export function referencePatternOfF699Dbi(facts: Omit<MaskFacts, 'frequencyHz'>, offAxisDeg: number): number {
  const { apertureOverWavelength, peakGainDbi } = facts;
  const firstLobeFrom = mainLobeEndOfF699Deg(facts);
  if (offAxisDeg < firstLobeFrom) return peakGainDbi - 2.5e-3 * (apertureOverWavelength * offAxisDeg) ** 2;
  const segment = [...sidelobesOfF699(apertureOverWavelength, firstLobeFrom)].reverse().find(({ fromDeg }) => offAxisDeg >= fromDeg);
  return segment === undefined ? firstLobeDbi(apertureOverWavelength) : segment.levelDb(offAxisDeg);
}

/** G1 = 2 + 15 log D/lambda. */
const firstLobeDbi = (apertureOverWavelength: number): number => 2 + 15 * Math.log10(apertureOverWavelength);

/** phi_m = 20 (lambda/D) sqrt(Gmax - G1). */
function mainLobeEndOfF699Deg({ apertureOverWavelength, peakGainDbi }: Omit<MaskFacts, 'frequencyHz'>): number {
  return (20 / apertureOverWavelength) * Math.sqrt(Math.max(0, peakGainDbi - firstLobeDbi(apertureOverWavelength)));
}

function sidelobesOfF699(apertureOverWavelength: number, mainLobeEndDeg: number): readonly MaskSegment[] {
  const large = apertureOverWavelength > 100;
  const plateauEnd = large ? 15.85 * apertureOverWavelength ** -0.6 : 100 / apertureOverWavelength;
  const shift = large ? 0 : 20 - 10 * Math.log10(apertureOverWavelength);
  const plateau = { fromDeg: mainLobeEndDeg, toDeg: plateauEnd, levelDb: constant(firstLobeDbi(apertureOverWavelength)) };
  return [
    ...(mainLobeEndDeg < plateauEnd ? [plateau] : []),
    { fromDeg: Math.max(mainLobeEndDeg, plateauEnd), toDeg: 48, levelDb: falling(32 + shift) },
    { fromDeg: 48, toDeg: 180, levelDb: constant(-10 + shift) },
  ];
}

function f699(facts: MaskFacts): readonly MaskSegment[] | NoFigure {
  const { apertureOverWavelength, peakGainDbi } = facts;
  const end = mainLobeEndOfF699Deg(facts);
  if (Math.max(end, 100 / apertureOverWavelength) >= 48) return tooSmall(facts, 'its main lobe passes 48°');
  if (peakGainDbi <= firstLobeDbi(apertureOverWavelength)) {
    const text = `the gain, ${peakGainDbi.toFixed(1)} dBi, is not above its first sidelobe, ${firstLobeDbi(apertureOverWavelength).toFixed(1)} dBi, so it has no main lobe`;
    return noFigure('mask-not-applicable', `F.699 is undefined here: ${text}`);
  }
  return outsideOf('F.699', facts.frequencyHz, [[1, 70]]) ?? sidelobesOfF699(apertureOverWavelength, end);
}

function fccGeneral({ frequencyHz }: MaskFacts): readonly MaskSegment[] | NoFigure {
  const excluded: readonly Range[] = [[24.75, 25.25], [27.5, 30], ...CONVENTIONAL_KU];
  const inside = excluded.find((range) => within(range, frequencyHz));
  if (inside) return noFigure('mask-not-applicable', `25.209(a)(1) is not for ${inside[0]} to ${inside[1]} GHz; the frequency is ${ghz(frequencyHz)} GHz`);
  return [
    { fromDeg: 1.5, toDeg: 7, levelDb: falling(29) },
    // At 7° itself still the curve; above it the step.
    { fromDeg: 7 + 1e-9, toDeg: 9.2, levelDb: constant(8) },
    { fromDeg: 9.2 + 1e-9, toDeg: 48, levelDb: falling(32) },
    { fromDeg: 48 + 1e-9, toDeg: 180, levelDb: constant(-10) },
  ];
}

/** From memory: 47 CFR 25.103. */
const CONVENTIONAL_KU: readonly Range[] = [[11.7, 12.2], [14, 14.5]];

function fccKu({ frequencyHz }: MaskFacts): readonly MaskSegment[] | NoFigure {
  return outsideOf('25.209(a)(2)', frequencyHz, CONVENTIONAL_KU) ?? [
    { fromDeg: 1.5, toDeg: 7, levelDb: falling(29) },
    { fromDeg: 7 + 1e-9, toDeg: 9.2, levelDb: constant(8) },
    { fromDeg: 9.2 + 1e-9, toDeg: 19.1, levelDb: falling(32) },
    { fromDeg: 19.1 + 1e-9, toDeg: 180, levelDb: constant(0) },
  ];
}

const ghz = (frequencyHz: number): string => String(Number((frequencyHz / 1e9).toPrecision(6)));
/** A billionth of slack, because hertz have been multiplied from gigahertz. */
const within = ([low, high]: Range, frequencyHz: number): boolean => frequencyHz >= low * 1e9 - 1 && frequencyHz <= high * 1e9 + 1;

function outsideOf(name: string, frequencyHz: number, ranges: readonly Range[]): NoFigure | undefined {
  if (ranges.some((range) => within(range, frequencyHz))) return undefined;
  const text = ranges.map(([low, high]) => `${low} to ${high} GHz`).join(' and ');
  return noFigure('mask-not-applicable', `${name} is for ${text}; the frequency is ${ghz(frequencyHz)} GHz`);
}

function tooSmall({ apertureOverWavelength }: MaskFacts, why: string): NoFigure {
  return noFigure('mask-not-applicable', `undefined for a panel of ${apertureOverWavelength.toFixed(1)} wavelengths: ${why}`);
}

const ITU_S465_TAIL = '32 − 25 log φ, φ < 48°; −10 from 48° to 180°';

export const PUBLISHED_MASKS: readonly PublishedMask[] = [
  {
    id: 'itu-r-s465-6',
    title: 'ITU-R S.465-6',
    edition: '01/2010',
    formula: [`φmin ≤ φ: ${ITU_S465_TAIL}`, 'φmin = max(1°, 100 λ/D) for D/λ ≥ 50, max(2°, 114 (D/λ)^−1.09) below'],
    undefinedWhere: 'below φmin',
    ruleText: 'In every direction at and beyond φmin.',
    appliesTo: '2 to 31 GHz',
    source: 'Recommendation ITU-R S.465-6 (01/2010), recommends 2',
    status: 'formula confirmed in two independent public implementations',
    rule: EVERY_DIRECTION,
    segments: s465,
  },
  {
    id: 'itu-r-s580-6',
    title: 'ITU-R S.580-6',
    edition: '2004',
    formula: ['max(1°, 100 λ/D) ≤ φ ≤ 20°: 29 − 25 log φ', '20° < φ ≤ 26.3°: −3.5 dBi', `beyond as S.465-6: ${ITU_S465_TAIL}`],
    undefinedWhere: 'below max(1°, 100 λ/D), and for D/λ below 50',
    ruleText: 'A design objective for at least 90 % of the sidelobe peaks. Peaks of the whole hemisphere are counted, not those near one plane alone.',
    appliesTo: '2 to 31 GHz, as S.465-6 (from memory)',
    source: 'Recommendation ITU-R S.580-6 (2004)',
    status: 'formula confirmed in a public implementation; the rule of 90 % of the peaks from memory',
    rule: { kind: 'share-of-peaks', leastFraction: 0.9 },
    segments: s580,
  },
  {
    id: 'itu-r-f699-8',
    title: 'ITU-R F.699-8',
    edition: '-7 and -8 (2018)',
    formula: [
      'φ < φm: Gmax − 0.0025 (Dφ/λ)²; φm = 20 (λ/D) √(Gmax − G1)',
      'then G1 = 2 + 15 log D/λ, to 100 λ/D, or 15.85 (D/λ)^−0.6 for D/λ > 100',
      'D/λ ≤ 100: 52 − 10 log D/λ − 25 log φ, φ < 48°; then 10 − 10 log D/λ',
      'D/λ > 100: 32 − 25 log φ, φ < 48°; then −10',
    ],
    undefinedWhere: 'where the gain does not exceed G1. Below φm it describes the main lobe and is not judged',
    ruleText: 'In every direction at and beyond φm; Gmax is the predicted gain at the peak.',
    appliesTo: '1 to 70 GHz',
    source: 'Recommendation ITU-R F.699-7 and -8, recommends 2.1 and 2.2',
    status: 'confirmed in two public implementations; a later edition, -9 (02/2026), is listed by the ITU and was not seen: check it before use',
    rule: EVERY_DIRECTION,
    segments: f699,
  },
  {
    id: 'fcc-25-209-a1',
    title: '47 CFR 25.209(a)(1)',
    edition: 'text current to 30 September 2024',
    formula: ['1.5° ≤ θ ≤ 7°: 29 − 25 log θ', '7° < θ ≤ 9.2°: 8 dBi', '9.2° < θ ≤ 48°: 32 − 25 log θ', '48° < θ ≤ 180°: −10 dBi'],
    undefinedWhere: 'below 1.5°',
    ruleText: FCC_RULE_TEXT,
    appliesTo: 'not for conventional Ku band, 24.75 to 25.25 GHz and 27.5 to 30 GHz',
    source: '47 CFR 25.209(a)(1)',
    status: 'confirmed in a public text; earlier editions differ (2012: −10 dBi to 85°, 0 dBi beyond); the bands of conventional Ku from memory',
    rule: FCC_RULE,
    segments: fccGeneral,
  },
  {
    id: 'fcc-25-209-a2',
    title: '47 CFR 25.209(a)(2)',
    edition: 'text current to 30 September 2024',
    formula: ['1.5° ≤ θ ≤ 7°: 29 − 25 log θ', '7° < θ ≤ 9.2°: 8 dBi', '9.2° < θ ≤ 19.1°: 32 − 25 log θ', '19.1° < θ ≤ 180°: 0 dBi'],
    undefinedWhere: 'below 1.5°',
    ruleText: FCC_RULE_TEXT,
    appliesTo: 'conventional Ku band, 11.7 to 12.2 GHz and 14.0 to 14.5 GHz (bands from memory)',
    source: '47 CFR 25.209(a)(2)',
    status: 'confirmed in a public text; editions up to 2012 had 32 − 25 log θ to 48°, −10 dBi to 85°, 0 dBi beyond',
    rule: FCC_RULE,
    segments: fccKu,
  },
];

export function publishedMask(id: string): PublishedMask | undefined {
  return PUBLISHED_MASKS.find((known) => known.id === id);
}
