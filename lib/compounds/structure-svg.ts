/** A drawing larger than this is not a picture on a page but a way to exhaust memory. */
export const MAX_DRAWING_SIDE_PX = 2000;

const SHAPE = /<(line|polygon|text|circle|path)\b([^>]*?)(?:\/>|>([^<]*)<\/\1>)/g;
const NUMBER = /^-?\d+(?:\.\d+)?$/;
const POINTS = /^[-\d., ]+$/;

function attributesOf(text: string): Map<string, string> {
  return new Map([...text.matchAll(/([\w:-]+)="([^"]*)"/g)].map((match) => [match[1] ?? '', match[2] ?? '']));
}

function numbers(attributes: Map<string, string>, names: string[]): string | null {
  const written: string[] = [];
  for (const name of names) {
    const value = attributes.get(name) ?? '';
    if (!NUMBER.test(value)) return null;
    written.push(`${name}="${value}"`);
  }
  return written.join(' ');
}

/** One shape written anew from its numbers alone, in the colour of the text around it. */
function shape(kind: string, attributes: Map<string, string>, content: string): string | null {
  if (attributes.get('class') === 'event') return '';
  if (kind === 'line') {
    const ends = numbers(attributes, ['x1', 'y1', 'x2', 'y2']);
    const dashes = attributes.get('stroke-dasharray') ?? '';
    return ends && `<line ${ends}${POINTS.test(dashes) ? ` stroke-dasharray="${dashes}"` : ''}/>`;
  }
  if (kind === 'polygon') {
    const points = (attributes.get('points') ?? '').trim();
    return POINTS.test(points) ? `<polygon points="${points}" fill="currentColor"/>` : null;
  }
  if (kind === 'circle') {
    const place = numbers(attributes, ['cx', 'cy', 'r']);
    return place && `<circle ${place} fill="currentColor" stroke="none"/>`;
  }
  if (kind === 'text') {
    const place = numbers(attributes, ['x', 'y', 'font-size']);
    return place && /^[A-Za-z0-9+\-]+$/.test(content)
      ? `<text ${place} fill="currentColor" stroke="none">${content}</text>`
      : null;
  }
  return null;
}

export function escapeXml(text: string): string {
  const entities: Record<string, string> = {
    '&': '&amp;',
    '<': '&lt;',
    '>': '&gt;',
    '"': '&quot;',
    "'": '&#39;',
  };
  return text.replace(/[&<>"']/g, (sign) => entities[sign] ?? '');
}

/**
 * Writes a drawing of the structure library anew as plain shapes: no style, script, identifier or event, every colour
 * `currentColor`, so that it can stand in a page in a light and a dark theme and several times on one page.
 * @param drawn SVG as the structure library writes it. @param widthPx, heightPx its size. @param title for screen readers.
 * @throws Error where a shape is met that this writer does not know: half a structure would be a wrong structure.
 */
export function rewriteDrawing(drawn: string, widthPx: number, heightPx: number, title: string): string {
  const shapes: string[] = [];
  for (const match of drawn.matchAll(SHAPE)) {
    const written = shape(match[1] ?? '', attributesOf(match[2] ?? ''), match[3] ?? '');
    if (written === null)
      throw new Error(`The structure drawing holds a shape that cannot be shown: ${match[1]}.`);
    if (written !== '') shapes.push(written);
  }
  const name = escapeXml(title);
  return [
    `<svg xmlns="http://www.w3.org/2000/svg" width="${widthPx}" height="${heightPx}" viewBox="0 0 ${widthPx} ${heightPx}"`,
    ` role="img" aria-label="${name}" stroke="currentColor" stroke-width="1.5" stroke-linecap="round"`,
    ` stroke-linejoin="round" font-family="Lato, sans-serif"><title>${name}</title>${shapes.join('')}</svg>`,
  ].join('');
}
