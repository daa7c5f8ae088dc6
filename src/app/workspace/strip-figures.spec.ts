import type { Figure } from '../../../shared/model/figures';
import { SAMPLE_FIGURES, SAMPLE_VERDICTS } from './sample-prediction';
import { figureText, signedText, stripFigures } from './strip-figures';
import type { PredictedFigures, StripFigure } from './strip-figures';

const now: PredictedFigures = { figures: SAMPLE_FIGURES, verdicts: SAMPLE_VERDICTS };
const figure = (id: StripFigure['id'], of = now, parent: PredictedFigures | null = null): StripFigure => {
  const found = stripFigures(of, parent).find((entry) => entry.id === id);
  if (!found) throw new Error(`no figure ${id}`);
  return found;
};

describe('stripFigures', () => {
  it('shows gain with its limit, signed margin and change against the parent', () => {
    const parent: PredictedFigures = {
      figures: { ...SAMPLE_FIGURES, gainDbi: 34.74 },
      verdicts: [{ ...SAMPLE_VERDICTS[0], value: 34.74, margin: 0.74 }],
    };
    expect(figure('gain', now, parent)).toMatchObject({ value: '34.76', unit: 'dBi', trend: '+0.02', limit: '≥ 34.0', margin: '+0.76', verdict: 'meets' });
  });

  it('puts the value on the allowed side of the gauge as far as its margin', () => {
    expect(figure('gain').gauge).toEqual({ limitAt: 1 / 3, valueAt: expect.closeTo(1 / 3 + 0.76 / 3, 12), forbidden: 'left' });
    expect(figure('sidelobe').gauge).toEqual({ limitAt: 2 / 3, valueAt: expect.closeTo(2 / 3 - 0.25, 12), forbidden: 'right' });
  });

  it('keeps a value far beyond its limit at the end of the gauge', () => {
    const far: PredictedFigures = { ...now, verdicts: [{ ...SAMPLE_VERDICTS[0], value: 3, margin: -31, verdict: 'falls-short' }] };
    expect(figure('gain', far).gauge?.valueAt).toBeCloseTo(0, 12);
    expect(figure('gain', far).margin).toBe('−31.00');
  });

  it('says why a figure does not exist instead of showing a number', () => {
    expect(figure('mask')).toMatchObject({ value: '–', unit: '', trend: null, limit: 'no limit set', verdict: null, reason: 'No mask is set' });
  });

  it('never shows a line that was not evaluated as met', () => {
    const open: PredictedFigures = {
      ...now,
      verdicts: [{ ...SAMPLE_VERDICTS[0], value: { kind: 'no-lobe', reason: 'No lobe found' }, margin: { kind: 'no-lobe', reason: 'No lobe found' }, verdict: 'not-evaluated' }],
    };
    expect(figure('gain', open)).toMatchObject({ value: '–', limit: '≥ 34.0, not evaluated', margin: null, verdict: 'not-evaluated', gauge: null });
  });

  it('shows one dash and no unit where there is no beamwidth at all, and a dash for the one that is missing', () => {
    const none: Figure = { kind: 'no-beam', reason: 'the beam has no half-power point' };
    const shown = (along: Figure, across: Figure) => figure('beamwidth', { ...now, figures: { ...SAMPLE_FIGURES, halfPowerBeamwidthDeg: { along, across } } });
    expect(shown(none, none)).toMatchObject({ value: '–', unit: '', reason: 'the beam has no half-power point' });
    expect(shown(3.291, none)).toMatchObject({ value: '3.29×–', unit: '°' });
  });

  it('shows both beamwidths and the count of cells', () => {
    expect(figure('beamwidth')).toMatchObject({ value: '3.29×3.13', unit: '°', limit: 'no limit set' });
    expect(figure('cells')).toMatchObject({ value: '1\u00a0600', limit: 'all propagating' });
    const evanescent = { ...now, figures: { ...SAMPLE_FIGURES, evanescentCells: 12 } };
    expect(figure('cells', evanescent).limit).toBe('12 evanescent');
  });

  it('shows efficiency in per cent', () => {
    expect(figure('efficiency')).toMatchObject({ value: '68.2', unit: '%' });
  });
});

describe('figureText', () => {
  it('writes a true minus, no negative zero, and groups long numbers', () => {
    expect(figureText(-19.5, 2)).toBe('−19.50');
    expect(figureText(-0.0001, 2)).toBe('0.00');
    expect(figureText(1000000, 0)).toBe('1\u00a0000\u00a0000');
  });

  it('always signs a change except zero', () => {
    expect([signedText(0.76, 2), signedText(-0.42, 2), signedText(0.001, 2)]).toEqual(['+0.76', '−0.42', '0.00']);
  });
});
