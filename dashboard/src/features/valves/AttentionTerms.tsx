import { Box } from '@mui/material';
import { type PresentedAssessment } from '@tailrace/shared/contracts/assessments';
import { number } from '@tailrace/shared/messages/figures';
import { type Criticality } from '@tailrace/shared/core/data-sheet';

interface AttentionTermsProps {
  attention: number;
  terms: PresentedAssessment['attentionTerms'];
  criticality: Criticality;
}

/** How attention comes about, term by term (methods.md §9.3). */
export function AttentionTerms({ attention, terms, criticality }: AttentionTermsProps) {
  if (terms.length === 0) return null;
  return (
    <Box sx={{ color: 'text.secondary', fontSize: '0.875rem', mt: 1 }}>
      {`Attention ${number(attention)} at ${criticality} criticality, from weight × severity × confidence of each finding that counts: `}
      {terms.map(({ kind, weight, severity, confidence }, i) => (
        <span key={kind}>
          {`${i > 0 ? '; ' : ''}${kind} ${number(weight, 2)} × ${number(severity, 2)} × ${number(confidence, 2)} = `}
          <b>{number(weight * severity * confidence, 2)}</b>
        </span>
      ))}
      .
    </Box>
  );
}
