import { afterEach, describe, expect, test } from 'vitest';
import { drawingText } from './save-drawing';

function aDrawing(): SVGSVGElement {
  document.body.innerHTML = `
    <div style="--tr-ink: #1e2a2f; --tr-paper: #f5f3ee">
      <svg viewBox="0 0 320 200" width="100%" height="200"><path stroke="var(--tr-ink)" d="M0,0H9"/><g data-cursor><circle r="6"/></g></svg>
    </div>`;
  return document.querySelector('svg') as SVGSVGElement;
}

afterEach(() => {
  document.body.innerHTML = '';
});

describe('a saved drawing', () => {
  test('has the theme’s colours written out, and paper under it', () => {
    const text = drawingText(aDrawing(), 'FV-1 flow', null);
    expect(text).toContain('stroke="#1e2a2f"');
    expect(text).toContain('fill="#f5f3ee"');
    expect(text).not.toContain('var(');
  });

  test('has a size of its own, so that any program opens it', () => {
    expect(drawingText(aDrawing(), 'FV-1 flow', null)).toMatch(/<svg[^>]* width="348"[^>]* height="254"/);
  });

  test('says whose it is, above the drawing', () => {
    const text = drawingText(aDrawing(), 'FV-1 flow', null);
    expect(text).toMatch(/<text y="-14"[^>]*>FV-1 flow<\/text>/);
    expect(text).toContain('viewBox="-14 -40 348 254"');
  });

  test('carries the typeface where it could be had', () => {
    expect(drawingText(aDrawing(), 'FV-1 flow', 'data:font/woff2;base64,AAAA')).toContain(
      'src:url(data:font/woff2;base64,AAAA)',
    );
    expect(drawingText(aDrawing(), 'FV-1 flow', null)).not.toContain('@font-face');
  });

  test('leaves the cursor out and the drawing on the page alone', () => {
    const svg = aDrawing();
    expect(drawingText(svg, 'FV-1 flow', null)).not.toContain('data-cursor');
    expect(svg.querySelector('[data-cursor]')).not.toBeNull();
  });
});
