/** An SVG document as a PNG of `scale` pixels per unit. Rejects when the browser cannot draw it. */
export async function svgToPng(document: Document, svg: string, scale: number): Promise<Blob> {
  const address = URL.createObjectURL(new Blob([svg], { type: 'image/svg+xml' }));
  try {
    const image = document.createElement('img');
    image.src = address;
    await image.decode();
    const canvas = document.createElement('canvas');
    canvas.width = Math.round(image.naturalWidth * scale);
    canvas.height = Math.round(image.naturalHeight * scale);
    const context = canvas.getContext('2d');
    if (!context) throw new Error('this browser gives no drawing surface');
    context.drawImage(image, 0, 0, canvas.width, canvas.height);
    return await new Promise<Blob>((resolve, reject) => {
      canvas.toBlob((blob) => (blob ? resolve(blob) : reject(new Error('this browser cannot write PNG'))), 'image/png');
    });
  } finally {
    URL.revokeObjectURL(address);
  }
}

/** The faces of the product as rules with their data inside: a picture drawn apart from the page cannot fetch them. */
export async function embeddedFaces(document: Document): Promise<string> {
  const rules = [...document.styleSheets].flatMap(rulesOf).filter((rule) => rule instanceof CSSFontFaceRule);
  const loaded = new Set([...document.fonts].filter((face) => face.status === 'loaded').map((face) => faceKey(face.family, face.weight, face.unicodeRange)));
  const used = rules.filter(({ style }) =>
    loaded.has(faceKey(style.getPropertyValue('font-family'), style.getPropertyValue('font-weight'), style.getPropertyValue('unicode-range'))),
  );
  return (await Promise.all(used.map((rule) => withData(document, rule)))).join('\n');
}

function rulesOf(sheet: CSSStyleSheet): CSSRule[] {
  // Sheets of other origins cannot be read; there are none of ours among them.
  return sheet.href === null || new URL(sheet.href).origin === location.origin ? [...sheet.cssRules] : [];
}

function faceKey(family: string, weight: string, range: string): string {
  const plain = (text: string): string => text.replace(/["'\s]/g, '').toUpperCase();
  return [plain(family), plain(weight === '' ? '400' : weight).replace('NORMAL', '400'), plain(range === '' ? 'U+0-10FFFF' : range)].join('|');
}

async function withData(document: Document, rule: CSSFontFaceRule): Promise<string> {
  const source = rule.style.getPropertyValue('src');
  const address = /url\("?([^")]+)"?\)/.exec(source)?.[1];
  if (address === undefined) return rule.cssText;
  const reply = await fetch(new URL(address, rule.parentStyleSheet?.href ?? document.baseURI));
  const bytes = new Uint8Array(await reply.arrayBuffer());
  let binary = '';
  for (let i = 0; i < bytes.length; i += 0x8000) binary += String.fromCharCode(...bytes.subarray(i, i + 0x8000));
  return rule.cssText.replace(source, `url("data:font/woff2;base64,${btoa(binary)}") format("woff2")`);
}
