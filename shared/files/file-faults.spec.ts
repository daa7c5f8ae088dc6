import { FileFaults, quoted } from './file-faults';

describe('FileFaults', () => {
  it('gives messages by line, with only the fields they have', () => {
    const faults = new FileFaults();
    faults.warn(9, 'late');
    faults.error(3, 'early', 'do this');
    faults.add('notice', { line: 5, column: 2, text: 'between' });
    expect(faults.messages()).toEqual([
      { severity: 'error', line: 3, text: 'early', suggestion: 'do this' },
      { severity: 'notice', line: 5, column: 2, text: 'between' },
      { severity: 'warning', line: 9, text: 'late' },
    ]);
  });

  it('knows errors from warnings', () => {
    const faults = new FileFaults();
    faults.warn(1, 'odd');
    expect(faults.hasErrors).toBe(false);
    faults.error(1, 'wrong');
    expect(faults.hasErrors).toBe(true);
  });

  it('says a repeated thing once', () => {
    const faults = new FileFaults();
    [4, 5, 6].forEach((line) => faults.warnOnce('exponent', line, { text: 'D exponent' }));
    expect(faults.messages()).toEqual([{ severity: 'warning', line: 4, text: 'D exponent' }]);
  });

  it('counts the faults beyond its bound, and still knows of them', () => {
    const faults = new FileFaults(2);
    faults.warn(1, 'a');
    faults.warn(2, 'b');
    faults.error(3, 'c');
    expect(faults.hasErrors).toBe(true);
    expect(faults.messages()[2]).toEqual({ severity: 'error', line: 0, text: '1 further faults are not listed' });
  });
});

describe('quoted', () => {
  it('shortens long text and shows control characters and lone surrogates', () => {
    expect(quoted('x'.repeat(50))).toBe(`"${'x'.repeat(40)}..."`);
    expect(quoted('a\u0000b\u009f\ud800')).toBe('"a\\u0000b\\u009f\\ud800"');
  });
});
