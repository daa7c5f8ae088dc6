import { evaluate } from 'mathjs/number';
import fc from 'fast-check';
import { LONGEST_FORMULA, maskFormula } from './mask-formula';

function valueOf(text: string, theta: number): number {
  const formula = maskFormula(text);
  if (formula.kind === 'fault') throw new Error(formula.detail);
  return formula.levelDb(theta);
}

function faultOf(text: string): string {
  const formula = maskFormula(text);
  return formula.kind === 'fault' ? formula.detail : 'no fault';
}

/** Expressions of the grammar, with a depth that grows. */
const expressions = fc.letrec<{ node: string }>((tie) => ({
  node: fc.oneof(
    { maxDepth: 4 },
    fc.constantFrom('theta', 'pi', '2', '0.5', '1e1', '.25', '(theta)'),
    fc.tuple(tie('node'), fc.constantFrom('+', '-', '*', '/', ' ^ '), tie('node')).map((parts) => parts.join('')),
    tie('node').map((inner) => `-${inner}`),
    tie('node').map((inner) => `(${inner})`),
    tie('node').map((inner) => `cos(${inner})`),
    fc.tuple(tie('node'), tie('node')).map(([a, b]) => `max(${a}, ${b})`),
  ),
}));

describe('a mask formula', () => {
  it('gives the levels of published envelopes', () => {
    expect(valueOf('32 - 25*log10(theta)', 10)).toBeCloseTo(7, 12);
    expect(valueOf('max(29 - 25 * log10(theta), -3.5)', 60)).toBe(-3.5);
    expect(valueOf('40 - 12*(theta/1.8)^2', 1.8)).toBeCloseTo(28, 12);
  });

  it('reads what mathjs reads, with the same value', () => {
    fc.assert(
      fc.property(expressions.node, fc.double({ min: 0.1, max: 180, noNaN: true }), (text, theta) => {
        fc.pre(text.length <= LONGEST_FORMULA && maskFormula(text).kind === 'formula');
        const expected: unknown = evaluate(text, { theta });
        if (typeof expected !== 'number') throw new Error(`mathjs gives no number for ${text}`);
        if (!Number.isFinite(expected)) expect(Number.isFinite(valueOf(text, theta))).toBe(false);
        else expect(Math.abs(valueOf(text, theta) - expected)).toBeLessThanOrEqual(1e-9 * Math.max(1, Math.abs(expected)));
      }),
      { seed: 7, numRuns: 400 },
    );
  });

  it('keeps the order of operations: signs below powers, powers from the right', () => {
    expect([valueOf('-2^2', 0), valueOf('2^3^2', 0), valueOf('2^-1', 0), valueOf('8/4/2', 0), valueOf('1-2-3', 0)]).toEqual([-4, 512, 0.5, 1, -4]);
  });

  it.each([
    ['theta = 3', '"=" is not expected, at character 7'],
    ['f(x) = x', '"f" is not known; known are theta, pi, e, abs, sqrt, exp, log, log10, log2, sin, cos, tan, min, max, at character 1'],
    ['theta.constructor', '"." is not expected, at character 6'],
    ['constructor', '"constructor" is not known'],
    ['import("fs")', '"import" is not known'],
    ['[1,2]', '"[" is not expected'],
    ['"a"', '""" is not expected'],
    ['1; 2', '";" is not expected'],
    ['cos', '"(" is missing'],
    ['cos(1, 2)', 'cos takes 1 values; got 2'],
    ['2 theta', '"t" is not expected'],
    ['', 'the formula ends too early, at character 1'],
    ['3 +', 'the formula ends too early'],
    ['(1', '")" is missing'],
  ])('refuses %s and says where', (text, detail) => {
    expect(faultOf(text)).toContain(detail);
  });

  it('bounds length, parts and depth', () => {
    expect(faultOf('1'.repeat(LONGEST_FORMULA + 1))).toBe('must have at most 200 characters; got 201');
    expect(faultOf(`1${'+1'.repeat(90)}`)).toContain('more than 120 parts');
    expect(faultOf(`${'('.repeat(60)}1${')'.repeat(60)}`)).toContain('nested more than 24 deep');
  });
});
