import { Box, Typography } from '@mui/material';
import { CharacteristicChart } from '../../charts/CharacteristicChart';
import { CharacteristicGlyph } from '../../charts/CharacteristicGlyph';
import {
  sampleCharacteristic,
  sampleDeviation,
  sampleGlyphs,
  sampleInstalled,
  sampleRange,
  sampleRidges,
} from '../../charts/chart-samples';
import { TravelRidge, TravelRidgeAxis } from '../../charts/TravelRidge';

/** Every drawing of Tailrace with invented data, to look at while working on it. */
export function Component() {
  return (
    <Box sx={{ display: 'grid', gap: 4, maxWidth: 980, mx: 'auto', p: 2 }}>
      <Box component="section">
        <Typography component="h2" variant="h6">
          Travel ridge
        </Typography>
        <TravelRidgeAxis />
        {sampleRidges.map(({ tag, words, ridge }) => (
          <Box key={tag} sx={{ display: 'flex', flexWrap: 'wrap', gap: 2, alignItems: 'center', my: 0.5 }}>
            <TravelRidge ridge={ridge} label={tag} />
            <Typography variant="body2">
              {tag} {words}
            </Typography>
          </Box>
        ))}
      </Box>
      <Box component="section">
        <Typography component="h2" variant="h6">
          Characteristic glyph
        </Typography>
        <Box sx={{ display: 'flex', gap: 3 }}>
          {sampleGlyphs.map(({ tag, glyph }) => (
            <CharacteristicGlyph key={tag} glyph={glyph} label={tag} />
          ))}
        </Box>
      </Box>
      <CharacteristicChart
        tag="FV-2101"
        characteristic={sampleCharacteristic}
        range={sampleRange}
        deviation={sampleDeviation}
      />
      <CharacteristicChart tag="LV-3307" characteristic={sampleInstalled} range={null} deviation={null} />
    </Box>
  );
}
