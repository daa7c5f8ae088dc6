import type { CDPSession, Page } from 'playwright-core';

/** The characters that a page shows in one face. */
interface ShownText {
  readonly family: string;
  readonly weight: string;
  readonly characters: string;
}

/** Every character on the page that is painted, by the family and weight it is asked for in. */
function shownTexts(): ShownText[] {
  const found = new Map<string, Set<string>>();
  const walker = document.createTreeWalker(document.body, NodeFilter.SHOW_TEXT);
  for (let node = walker.nextNode(); node; node = walker.nextNode()) {
    const parent = node.parentElement;
    if (!parent || /^(SCRIPT|STYLE|TITLE|TEMPLATE)$/i.test(parent.tagName)) continue;
    const { fontFamily, fontWeight } = getComputedStyle(parent);
    const key = `${fontFamily}\n${fontWeight}`;
    const characters = found.get(key) ?? new Set();
    for (const character of node.textContent ?? '') if (/\S/.test(character)) characters.add(character);
    found.set(key, characters);
  }
  return [...found].map(([key, characters]) => ({ family: key.split('\n')[0], weight: key.split('\n')[1], characters: [...characters].join('') }));
}

/** Draws text in a face at the end of the page; the browser then knows which fonts it took. */
function drawProbe({ family, weight, characters }: ShownText): void {
  document.getElementById('font-probe')?.remove();
  const probe = document.createElement('p');
  probe.id = 'font-probe';
  probe.style.fontFamily = family;
  probe.style.fontWeight = weight;
  probe.textContent = characters;
  document.body.append(probe);
  probe.getBoundingClientRect();
}

async function takenFonts(page: Page, session: CDPSession, text: ShownText): Promise<string[]> {
  await page.evaluate(drawProbe, text);
  await page.evaluate(() => document.fonts.ready.then(() => undefined));
  const { root } = await session.send('DOM.getDocument');
  const { nodeId } = await session.send('DOM.querySelector', { nodeId: root.nodeId, selector: '#font-probe' });
  const { fonts } = await session.send('CSS.getPlatformFontsForNode', { nodeId });
  return fonts.filter(({ isCustomFont }) => !isCustomFont).map(({ familyName }) => familyName);
}

/** The characters that fall back to a font of the machine, each with the face it was asked for in; a test expects none. */
export async function fallbackCharacters(page: Page, extra = ''): Promise<string[]> {
  const session = await page.context().newCDPSession(page);
  await session.send('DOM.enable');
  await session.send('CSS.enable');
  const faults: string[] = [];
  for (const text of await page.evaluate(shownTexts)) {
    const characters = text.characters + extra;
    if (characters === '' || (await takenFonts(page, session, { ...text, characters })).length === 0) continue;
    for (const character of new Set(characters)) {
      const taken = await takenFonts(page, session, { ...text, characters: character });
      if (taken.length > 0) faults.push(`${character} (U+${character.codePointAt(0)?.toString(16).padStart(4, '0')}) of ${text.family} ${text.weight}: ${taken.join(', ')}`);
    }
  }
  await page.evaluate(() => document.getElementById('font-probe')?.remove());
  await session.detach();
  return faults;
}
