import { characteristicGlyph, type Glyph } from '@tailrace/shared/charts/characteristic-glyph';
import { glyphInWords } from './chart-words';
import { inks } from './inks';

interface CharacteristicGlyphProps {
  glyph: Glyph | null;
  /** whose characteristic it is: the tag */
  label: string;
  /** px of the square's side */
  size?: number;
}

/** Specified curve thin, as-found curve thick, over the travel really visited. */
export function CharacteristicGlyph({ glyph, label, size = 40 }: CharacteristicGlyphProps) {
  const { frame, specified, asFound, dot } = characteristicGlyph(glyph, size);
  return (
    <svg
      role="img"
      aria-label={`${label}, ${glyphInWords(glyph)}`}
      viewBox={`0 0 ${size} ${size}`}
      width={size}
      height={size}
      fill="none"
    >
      <path d={`M${frame.left - 1},${frame.top}V${frame.bottom + 1}H${frame.right}`} stroke={inks.line} />
      <path d={specified} stroke={inks.quiet} strokeWidth={1} />
      <path d={asFound} stroke={inks.ink} strokeWidth={3} strokeLinecap="round" strokeLinejoin="round" />
      {dot && <circle cx={dot.x} cy={dot.y} r={2.5} fill={inks.ink} />}
    </svg>
  );
}
