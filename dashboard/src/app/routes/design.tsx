import { Box, Typography } from '@mui/material';
import { CharacteristicChart } from '../../charts/CharacteristicChart';
import { CharacteristicGlyph } from '../../charts/CharacteristicGlyph';
import {
  sampleCharacteristic,
  sampleDeviation,
  sampleDrift,
  sampleGain,
  sampleGlyphs,
  sampleInstalled,
  sampleMovement,
  sampleRange,
  sampleRidges,
  sampleSplit,
} from '../../charts/chart-samples';
import { DeviationChart } from '../../charts/DeviationChart';
import { DriftChart } from '../../charts/DriftChart';
import { GainChart } from '../../charts/GainChart';
import { MovementBars } from '../../charts/MovementBars';
import { SplitChart } from '../../charts/SplitChart';
import { TravelChart } from '../../charts/TravelChart';
import { TravelRidge, TravelRidgeAxis } from '../../charts/TravelRidge';
import { PageTitle } from '../../ui/PageTitle';

/** Every drawing of Tailrace with invented data, to look at while working on it. */
export function Component() {
  return (
    <Box sx={{ display: 'grid', gap: 4, maxWidth: 980 }}>
      <PageTitle>Drawings</PageTitle>
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
      <TravelChart tag="FV-2101" ridge={{ ...sampleRange, shares: sampleRange.ridge }} />
      <DeviationChart tag="FV-2101" bins={sampleDeviation.byTravel} />
      <GainChart tag="FV-2101" gain={sampleGain} />
      <DriftChart tag="FV-2101" drift={sampleDrift} zone="Europe/Zurich" />
      <MovementBars tag="FV-2101" movement={sampleMovement} zone="Europe/Zurich" />
      <SplitChart
        tag="FV-2101"
        title="Demand to position"
        reference="Demand, %"
        response="Position, %"
        split={sampleSplit}
      />
      <CharacteristicChart tag="LV-3307" characteristic={sampleInstalled} range={null} deviation={null} />
    </Box>
  );
}
