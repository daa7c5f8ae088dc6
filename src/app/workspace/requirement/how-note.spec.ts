import { sheetRig } from '../fields/sheet-rig';
import { REQUIREMENT_HOW } from './requirement-how';
import { TransmissionSection } from './transmission-section';

describe('notes on how figures of the requirement are computed', () => {
  it('hold formula, conventions, limits and a source with its check', () => {
    for (const how of Object.values(REQUIREMENT_HOW)) {
      expect([how.formula.length > 0, how.meaning, how.conventions, how.validity, how.source].every(Boolean)).toBe(true);
      expect(how.source).toMatch(/check|spec\.ts/);
    }
  });

  it('use no sign that the faces lack', () => {
    const allowed = /^[\u0000-\u00ff\u0391-\u03c9\u2013\u2014\u2032\u2033\u2070-\u209c\u2190-\u2193\u2211\u2212\u221a\u222b\u2260\u2264\u2265]*$/;
    const texts = Object.values(REQUIREMENT_HOW).flatMap((how) => [...how.formula, how.meaning, how.conventions, how.validity, how.source]);
    expect(texts.filter((text) => !allowed.test(text))).toEqual([]);
  });

  it('never call anything safe or lawful', () => {
    expect(JSON.stringify(REQUIREMENT_HOW)).not.toMatch(/\bsafe\b|compliant|approved|certified/i);
  });

  it('stand closed beside their figures', async () => {
    const { press, element } = await sheetRig(TransmissionSection);
    await press('Set a transmitter');
    const notes = [...element.querySelectorAll('details')];
    expect(notes.map((note) => note.querySelector('summary')?.textContent)).toEqual(expect.arrayContaining(['How computed: EIRP', 'How computed: EIRP density and its margin']));
    expect(notes.every((note) => !note.open)).toBe(true);
  });
});
