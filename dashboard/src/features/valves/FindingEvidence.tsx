import { Box } from '@mui/material';
import { type ReactNode } from 'react';
import { type AssessedFinding, type LivingFinding } from '@tailrace/shared/contracts/findings';
import { evidenceInWords } from '@tailrace/shared/messages/evidence';
import { limitsInWords } from '@tailrace/shared/messages/screens';
import { significant } from '../../lib/numbers';
import { FindingPhrase } from '../../ui/FindingPhrase';
import { Instant } from '../../ui/Instant';

interface FindingEvidenceProps {
  finding: AssessedFinding;
  /** the same finding as it lives on across assessments; left out for an older assessment */
  living: LivingFinding | undefined;
}

/** One finding: what was measured against which limits, what to do next, what could make it false. */
export function FindingEvidence({ finding, living }: FindingEvidenceProps) {
  const evidence = evidenceInWords(finding.evidence);
  return (
    <Box component="article" sx={{ py: 1, borderBottom: '1px solid var(--tr-line)', breakInside: 'avoid' }}>
      <Box sx={{ fontSize: '1.0625rem' }}>
        <FindingPhrase {...finding} number={living?.number} state={living?.state} />
      </Box>
      <Box
        sx={{
          pl: { md: '52px' },
          display: 'grid',
          columnGap: 4,
          rowGap: 1,
          gridTemplateColumns: { md: '1fr 1fr 1fr' },
          mt: 0.5,
          fontSize: '0.9375rem',
        }}
      >
        <div>
          <Named name="Evidence">
            {`${capital(limitsInWords(finding))}. Confidence ${significant(finding.confidence, 2)} of 1.`}
            {living && (
              <>
                {' First seen '}
                <Instant at={living.firstSeen} form="day" />.
              </>
            )}
          </Named>
          {evidence.length > 0 && (
            <Box component="dl" sx={{ m: 0, mt: 0.5, color: 'text.secondary', fontSize: '0.8125rem' }}>
              {evidence.map(({ name, figure }) => (
                <Box key={name} sx={{ display: 'inline-block', mr: 2 }}>
                  <Box component="dt" sx={{ display: 'inline' }}>{`${name} `}</Box>
                  <Box component="dd" sx={{ display: 'inline', m: 0, color: 'text.primary' }}>
                    {figure}
                  </Box>
                </Box>
              ))}
            </Box>
          )}
        </div>
        <Named name="Next step">{finding.nextStep}</Named>
        {finding.doubts.length > 0 && (
          <Named name="What could make it false">
            <Box component="ul" sx={{ m: 0, pl: 2 }}>
              {finding.doubts.map((doubt) => (
                <li key={doubt}>{doubt}</li>
              ))}
            </Box>
          </Named>
        )}
      </Box>
    </Box>
  );
}

function Named({ name, children }: { name: string; children: ReactNode }) {
  return (
    <div>
      <Box sx={{ color: 'text.secondary', fontSize: '0.8125rem', fontWeight: 500 }}>{name}</Box>
      <div>{children}</div>
    </div>
  );
}

const capital = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);
