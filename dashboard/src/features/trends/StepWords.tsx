import { Box } from '@mui/material';
import { steps, type Step } from './step-of';

const words: Record<Step, string> = {
  file: 'File',
  look: 'Look',
  plan: 'Plan and signals',
  'take in': 'Take in',
};

/** Where one is on the way from file to samples. */
export function StepWords({ at }: { at: Step }) {
  const place = steps.indexOf(at);
  return (
    <Box
      component="ol"
      aria-label="Steps"
      sx={{ listStyle: 'none', display: 'flex', flexWrap: 'wrap', columnGap: 3, m: 0, mb: 2, p: 0 }}
    >
      {steps.map((step, i) => (
        <Box
          component="li"
          key={step}
          aria-current={step === at ? 'step' : undefined}
          sx={{
            fontWeight: step === at ? 700 : undefined,
            color: i > place ? 'text.secondary' : undefined,
            borderBottom: '2px solid',
            borderColor: step === at ? 'var(--tr-ink)' : 'transparent',
          }}
        >
          {`${i + 1} ${words[step]}`}
        </Box>
      ))}
    </Box>
  );
}
