import { render, screen } from '@testing-library/react';
import { describe, expect, test } from 'vitest';
import { CharacteristicGlyph } from './CharacteristicGlyph';

describe('the characteristic glyph', () => {
  test('names the basis and the travel visited', () => {
    const asFound = [30, 60].map((travel) => ({ travel, value: travel / 100 }));
    render(<CharacteristicGlyph label="FV-1" glyph={{ basis: 'installed', specified: [], asFound }} />);
    expect(
      screen.getByRole('img', { name: 'FV-1, installed characteristic as found over 30 to 60 % travel' }),
    ).toHaveAttribute('width', '40');
  });

  test('says when no characteristic was found', () => {
    render(<CharacteristicGlyph label="FV-1" glyph={null} />);
    expect(screen.getByRole('img', { name: 'FV-1, no characteristic found' })).toBeInTheDocument();
  });
});
