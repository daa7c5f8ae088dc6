import { openEntrance } from './entrance-rig';
import { LettersPage } from './letters-page';

const letter = {
  id: '1',
  to: 'nora@merrow.example',
  subject: 'Invitation to the team Merrow Point on Slantwise',
  text: `This link works once:\n${location.origin}/invitation#6svRqNSARzF94ZJv\nForeign: https://elsewhere.example/x`,
  receivedAt: '2026-12-01T13:23:39.000Z',
};

describe('letters page', () => {
  it('shows letters with links into this client, and leaves foreign addresses as text', async () => {
    const { element, http, settled } = await openEntrance(LettersPage);
    http.expectOne('/api/development/letters').flush({ items: [letter] });
    await settled();
    expect(element.querySelector('h2')?.textContent).toBe(letter.subject);
    const links = [...element.querySelectorAll('article a')];
    expect(links.map((link) => link.getAttribute('href'))).toEqual(['/invitation#6svRqNSARzF94ZJv']);
    expect(element.textContent).toContain('https://elsewhere.example/x');
  });

  it('says what will stand here, and reads again when asked', async () => {
    const { element, http, settled } = await openEntrance(LettersPage);
    http.expectOne('/api/development/letters').flush({ items: [] });
    await settled();
    expect(element.textContent).toContain('No letters yet');
    element.querySelector('button')?.click();
    http.expectOne('/api/development/letters').flush({ items: [letter] });
    await settled();
    expect(element.querySelectorAll('article')).toHaveLength(1);
  });
});
