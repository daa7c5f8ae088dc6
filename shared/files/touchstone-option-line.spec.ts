import * as fc from 'fast-check';
import { FileFaults } from './file-faults';
import { readOptionLine } from './touchstone-option-line';
import type { OptionLine } from './touchstone-option-line';

function read(text: string): { option: OptionLine; said: string[] } {
  const faults = new FileFaults();
  const option = readOptionLine({ number: 7, text }, faults);
  return { option, said: faults.messages().map((m) => `${m.line} ${m.severity}: ${m.text}`) };
}

const exponents = { Hz: 0, kHz: 3, MHz: 6, GHz: 9 } as const;

describe('readOptionLine', () => {
  it('reads its four parts in any order and any case', () => {
    const unit = fc.constantFrom('Hz', 'kHz', 'MHz', 'GHz' as const);
    const parts = fc.record({ unit, parameter: fc.constantFrom('S', 'Y', 'Z', 'H', 'G'), format: fc.constantFrom('MA', 'DB', 'RI'), ohm: fc.integer({ min: 1, max: 1000 }) });
    fc.assert(
      fc.property(parts, fc.shuffledSubarray([0, 1, 2, 3], { minLength: 4 }), fc.boolean(), ({ unit: u, parameter, format, ohm }, order, isLower) => {
        const tokens = [u, parameter, format, `R ${ohm}`];
        const line = `# ${order.map((i) => tokens[i]).join(' ')}`;
        const { option, said } = read(isLower ? line.toLowerCase() : line);
        expect(option).toEqual({ frequencyExponent: exponents[u as keyof typeof exponents], parameter, format, referenceOhm: [ohm] });
        expect(said).toEqual([]);
      }),
      { seed: 111 },
    );
  });

  it('takes and tells the default of every part that is left out', () => {
    expect(read('#').option).toEqual({ frequencyExponent: 9, parameter: 'S', format: 'MA', referenceOhm: [50] });
    expect(read('# MHz RI').said).toEqual(["7 notice: The option line leaves out S, R 50: the format's default was taken"]);
  });

  it('reads a mark that touches the first token', () => {
    expect(read('#kHz S RI R 50').option.frequencyExponent).toBe(3);
  });

  it('keeps a list of resistances', () => {
    expect(read('# GHz S RI R 50 75 1e2').option.referenceOhm).toEqual([50, 75, 100]);
  });

  it.each([
    ['# GHz S RI R', '7 error: R is not followed by a resistance'],
    ['# GHz S RI R 50 R 75', '7 error: The option line gives R twice'],
    ['# GHz S RI R -5', '7 error: The reference resistance -5 is not a positive number of ohms'],
    ['# GHz S RI R 1e999', '7 error: The reference resistance Infinity is not a positive number of ohms'],
    ['# GHz S Z RI R 50', '7 error: The option line names two parameters, S and Z'],
    ['# GHz S RI DB R 50', '7 error: The option line names two formats, RI and DB'],
    ['# GHz S RI R 50 75 MHz', '7 error: The option line names two frequency units, GHZ and MHZ'],
    ['# GHz T RI R 50', '7 error: "T" on the option line is not understood'],
    ['# constructor S RI R 50', '7 error: "constructor" on the option line is not understood'],
  ])('refuses %j', (text, message) => {
    expect(read(text).said).toContain(message);
  });
});
