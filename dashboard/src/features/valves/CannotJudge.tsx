import { Box } from '@mui/material';
import { type PresentedAssessment } from '@tailrace/shared/contracts/assessments';

/** What this history cannot decide, and what data would let it. Reasons shared by several kinds are said once. */
export function CannotJudge({ notJudged }: { notJudged: PresentedAssessment['notJudged'] }) {
  const byReason = new Map<string, string[]>();
  for (const { kind, reason } of notJudged) byReason.set(reason, [...(byReason.get(reason) ?? []), kind]);
  return (
    <Box component="ul" sx={{ listStyle: 'none', m: 0, p: 0 }}>
      {[...byReason].map(([reason, kinds]) => (
        <Box
          component="li"
          key={reason}
          sx={{
            display: 'grid',
            gridTemplateColumns: { md: '18rem minmax(0, 1fr)' },
            columnGap: 3,
            py: 0.5,
            borderBottom: '1px solid var(--tr-line)',
          }}
        >
          <Box sx={{ fontWeight: 500 }}>{kinds.map(capital).join(', ')}</Box>
          <Box sx={{ color: 'text.secondary' }}>{reason}</Box>
        </Box>
      ))}
    </Box>
  );
}

const capital = (word: string) => word.charAt(0).toUpperCase() + word.slice(1);
