/** Properties that decide how a line or a text of ours looks. */
const DRAWN = [
  'fill', 'fill-opacity', 'stroke', 'stroke-width', 'stroke-dasharray', 'stroke-opacity', 'stroke-linejoin', 'paint-order', 'opacity',
  'font-family', 'font-size', 'font-weight', 'font-stretch', 'text-anchor', 'letter-spacing',
] as const;

/** Marks what belongs to the screen alone, such as handles and hit areas. */
export const SCREEN_ONLY = 'screen-only';

/**
 * The markup of a drawing on the screen with its style sheet written into it, so that it stands by itself. `shelter` is an
 * element under which the tokens of the wanted theme hold.
 */
export function svgSnapshot(live: SVGSVGElement, shelter: HTMLElement): string {
  const copy = live.cloneNode(true) as SVGSVGElement;
  copy.querySelectorAll(`.${SCREEN_ONLY}`).forEach((element) => element.remove());
  shelter.append(copy);
  for (const element of [copy, ...copy.querySelectorAll('*')]) writeStyle(element);
  copy.setAttribute('xmlns', 'http://www.w3.org/2000/svg');
  const markup = new XMLSerializer().serializeToString(copy);
  copy.remove();
  return markup;
}

function writeStyle(element: Element): void {
  const style = getComputedStyle(element);
  const parts = DRAWN.map((name) => [name, style.getPropertyValue(name)] as const).filter(([, value]) => value !== '');
  for (const attribute of [...element.attributes]) {
    if (/^(_ng|ng-|class$|aria-|tabindex$|role$)/.test(attribute.name)) element.removeAttribute(attribute.name);
  }
  // Paint servers are named with the address of the page while it is open; outside only the fragment holds.
  const value = parts.map(([name, text]) => `${name}:${text.replace(/url\("?[^"#)]*(#[^")]+)"?\)/g, 'url($1)')}`).join(';');
  if (value !== '') element.setAttribute('style', value);
}
