import fontAddress from '@fontsource/roboto-condensed/files/roboto-condensed-latin-400-normal.woff2?url';

const svgNames = 'http://www.w3.org/2000/svg';
/** px above the drawing for its title: a file is read far from the page that named it. */
const titleHeight = 40;
/** px of paper around the other sides */
const rim = 14;

/**
 * The drawing as a file of its own: title above it, theme colours written out, paper under it, and the typeface
 * inside it.
 *
 * @param svg the drawing on the page
 * @param title whose drawing of what it is
 * @param font the typeface as a data address; null: the reader's machine takes a narrow one it has
 */
export function drawingText(svg: SVGSVGElement, title: string, font: string | null): string {
  const theme = getComputedStyle(svg);
  const copy = svg.cloneNode(true) as SVGSVGElement;
  copy.querySelectorAll('[data-cursor]').forEach((cursor) => cursor.remove());
  const { width, height } = sizeOf(svg);
  mark(copy, { viewBox: `${-rim} ${-titleHeight} ${width} ${height}`, width, height });
  const style = document.createElementNS(svgNames, 'style');
  style.textContent = font
    ? `@font-face{font-family:"Roboto Condensed";src:url(${font}) format("woff2")}`
    : '';
  const paper = document.createElementNS(svgNames, 'rect');
  mark(paper, { x: -rim, y: -titleHeight, width, height, fill: 'var(--tr-paper)' });
  const heading = document.createElementNS(svgNames, 'text');
  mark(heading, { y: 26 - titleHeight, 'font-size': 15, fill: 'var(--tr-ink)' });
  heading.textContent = title;
  copy.prepend(style, paper, heading);
  return new XMLSerializer()
    .serializeToString(copy)
    .replaceAll(
      /var\((--[\w-]+)\)/g,
      (_, name: string) => theme.getPropertyValue(name).trim() || 'currentColor',
    )
    .replaceAll('currentColor', theme.color || '#000');
}

/** Saves the drawing under its title, as SVG or as a PNG of twice the size on screen. */
export async function saveDrawing(svg: SVGSVGElement, title: string, form: 'svg' | 'png'): Promise<void> {
  const text = drawingText(svg, title, await typeface());
  const file = new Blob([text], { type: 'image/svg+xml' });
  offer(form === 'svg' ? file : await raster(text, sizeOf(svg)), `${title}.${form}`);
}

/** px of a saved drawing. */
function sizeOf(svg: SVGSVGElement): { width: number; height: number } {
  const [, , width = 0, height = 0] = (svg.getAttribute('viewBox') ?? '').split(' ').map(Number);
  return { width: width + 2 * rim, height: height + titleHeight + rim };
}

function mark(element: Element, attributes: Record<string, string | number>): void {
  for (const [name, value] of Object.entries(attributes)) element.setAttribute(name, String(value));
}

/** The shipped typeface; null where it cannot be fetched, which spoils the letters but not the drawing. */
async function typeface(): Promise<string | null> {
  try {
    const answer = await fetch(fontAddress);
    return answer.ok ? await dataAddress(await answer.blob()) : null;
  } catch {
    return null;
  }
}

function dataAddress(blob: Blob): Promise<string> {
  return new Promise((resolve, reject) => {
    const reader = new FileReader();
    reader.onload = () => resolve(reader.result as string);
    reader.onerror = () => reject(new Error('The typeface could not be read.', { cause: reader.error }));
    reader.readAsDataURL(blob);
  });
}

async function raster(text: string, size: { width: number; height: number }): Promise<Blob> {
  const image = new Image();
  image.src = `data:image/svg+xml;charset=utf-8,${encodeURIComponent(text)}`;
  await image.decode();
  const canvas = document.createElement('canvas');
  [canvas.width, canvas.height] = [size.width * 2, size.height * 2];
  canvas.getContext('2d')?.drawImage(image, 0, 0, canvas.width, canvas.height);
  return new Promise((resolve, reject) => {
    canvas.toBlob((blob) => (blob ? resolve(blob) : reject(new Error('The picture could not be made.'))));
  });
}

function offer(file: Blob, name: string): void {
  const link = document.createElement('a');
  link.href = URL.createObjectURL(file);
  link.download = name;
  link.click();
  URL.revokeObjectURL(link.href);
}
