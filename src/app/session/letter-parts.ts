export interface LetterPart {
  readonly text: string;
  /** Address within this client when the part is a link to it. */
  readonly link: { readonly path: string; readonly fragment: string | undefined } | null;
}

/** Splits the text of a letter at its links to this server, so that they can be followed. Foreign addresses stay text. */
export function letterParts(text: string, origin: string): readonly LetterPart[] {
  const parts: LetterPart[] = [];
  let at = 0;
  for (const match of text.matchAll(/https?:\/\/[^\s>]+/g)) {
    const address = URL.canParse(match[0]) ? new URL(match[0]) : null;
    if (address === null || address.origin !== origin) continue;
    if (match.index > at) parts.push({ text: text.slice(at, match.index), link: null });
    parts.push({ text: match[0], link: { path: address.pathname, fragment: address.hash === '' ? undefined : address.hash.slice(1) } });
    at = match.index + match[0].length;
  }
  if (at < text.length) parts.push({ text: text.slice(at), link: null });
  return parts;
}
