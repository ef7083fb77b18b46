import fontAddress from '@fontsource/roboto-condensed/files/roboto-condensed-latin-400-normal.woff2?url';

/**
 * The drawing as a file of its own: theme colours written out, paper under it, and the typeface inside it.
 *
 * @param svg the drawing on the page
 * @param font the typeface as a data address; null: the reader's machine takes a narrow one it has
 */
export function drawingText(svg: SVGSVGElement, font: string | null): string {
  const theme = getComputedStyle(svg);
  const copy = svg.cloneNode(true) as SVGSVGElement;
  const [, , width = '0', height = '0'] = copy.getAttribute('viewBox')?.split(' ') ?? [];
  copy.setAttribute('width', width);
  copy.setAttribute('height', height);
  copy.querySelectorAll('[data-cursor]').forEach((mark) => mark.remove());
  const paper = copy.ownerDocument.createElementNS('http://www.w3.org/2000/svg', 'rect');
  const style = copy.ownerDocument.createElementNS('http://www.w3.org/2000/svg', 'style');
  for (const [name, value] of Object.entries({ width: '100%', height: '100%', fill: 'var(--tr-paper)' }))
    paper.setAttribute(name, value);
  style.textContent = font
    ? `@font-face{font-family:"Roboto Condensed";src:url(${font}) format("woff2")}`
    : '';
  copy.prepend(style, paper);
  return new XMLSerializer()
    .serializeToString(copy)
    .replaceAll(
      /var\((--[\w-]+)\)/g,
      (_, name: string) => theme.getPropertyValue(name).trim() || 'currentColor',
    )
    .replaceAll('currentColor', theme.color || '#000');
}

/** Saves the drawing under a name, as SVG or as a PNG of twice the size on screen. */
export async function saveDrawing(svg: SVGSVGElement, name: string, form: 'svg' | 'png'): Promise<void> {
  const text = drawingText(svg, await typeface());
  const file = new Blob([text], { type: 'image/svg+xml' });
  offer(form === 'svg' ? file : await raster(text, svg.clientWidth, svg.clientHeight), `${name}.${form}`);
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

async function raster(text: string, width: number, height: number): Promise<Blob> {
  const image = new Image();
  image.src = `data:image/svg+xml;charset=utf-8,${encodeURIComponent(text)}`;
  await image.decode();
  const canvas = document.createElement('canvas');
  [canvas.width, canvas.height] = [width * 2, height * 2];
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
