import { Box } from '@mui/material';

/** What a person must look at before a file is taken in. */
export function Doubts({ doubts }: { doubts: readonly string[] }) {
  if (doubts.length === 0) return null;
  return (
    <Box sx={{ my: 1.5, pl: 2, borderLeft: '3px solid var(--tr-ochre)' }}>
      <Box sx={{ fontWeight: 700 }}>To look at first</Box>
      <Box component="ul" sx={{ m: 0, pl: 2.25, maxWidth: '90ch' }}>
        {doubts.map((doubt) => (
          <li key={doubt}>{doubt}</li>
        ))}
      </Box>
    </Box>
  );
}
