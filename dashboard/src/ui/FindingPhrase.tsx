import { Box } from '@mui/material';
import { type FindingState } from '@tailrace/shared/contracts/findings';
import { severityInWords } from '@tailrace/shared/messages/screens';
import { SeverityBar } from './SeverityBar';

interface FindingPhraseProps {
  /** the finding written out: "Undersized: 31 % of the time above 90 % travel" */
  text: string;
  severity: number;
  /** the finding it is a consequence of; then its severity does not count */
  explainedBy: string | null;
  /** its number in the list of findings */
  number?: number;
  state?: FindingState;
}

/** A finding in words with its figure; how bad it is as a length, then a word, then a colour. */
export function FindingPhrase({ text, severity, explainedBy, number, state }: FindingPhraseProps) {
  const [kind, ...figure] = text.split(': ');
  return (
    <Box sx={{ display: 'flex', alignItems: 'baseline', gap: 1 }}>
      {explainedBy === null ? (
        <SeverityBar severity={severity} />
      ) : (
        <Box sx={{ flex: 'none', width: 44 }} aria-hidden />
      )}
      <Box component="span" sx={{ color: explainedBy ? 'text.secondary' : undefined }}>
        <Box component="span" sx={{ fontWeight: explainedBy ? 500 : 700 }}>
          {kind}
        </Box>
        {figure.length > 0 && `: ${figure.join(': ')}`}
        <Box component="span" sx={{ color: 'text.secondary', fontSize: '0.875em' }}>
          {explainedBy
            ? ` ·\u00a0explained by ${explainedBy}`
            : ` ·\u00a0${unbroken(severityInWords(severity))}`}
          {state && state !== 'new' ? ` ·\u00a0${state}` : ''}
          {number !== undefined ? ` ·\u00a0no.\u00a0${number}` : ''}
        </Box>
      </Box>
    </Box>
  );
}

const unbroken = (words: string) => words.replaceAll(' ', '\u00a0');
