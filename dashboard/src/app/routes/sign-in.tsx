import { Box, Typography } from '@mui/material';
import { Navigate, useNavigate, useSearchParams } from 'react-router-dom';
import { useQuery } from '@tanstack/react-query';
import { SignInForm } from '../../features/people/SignInForm';
import { meQuery } from '../../lib/session-query';
import { WaterLine } from '../layout/WaterLine';
import { Wordmark } from '../layout/Wordmark';
import { addressAfterSignIn } from '../require-me';

export function Component() {
  const [params] = useSearchParams();
  const navigate = useNavigate();
  const { data: me } = useQuery(meQuery);
  const next = addressAfterSignIn(params.get('from'));
  if (me) return <Navigate to={next} replace />;
  return (
    <Box component="main" sx={{ px: { xs: 2, sm: 6 }, pt: { xs: 4, sm: '16vh' }, maxWidth: 720 }}>
      <title>Sign in · Tailrace</title>
      <WaterLine />
      <Wordmark />
      <Typography variant="h1" sx={{ mt: 4, mb: 0.5 }}>
        Sign in
      </Typography>
      <Typography sx={{ color: 'text.secondary', mb: 3, maxWidth: '52ch' }}>
        {params.get('from')
          ? 'Sign in to go on where you were.'
          : 'Which control valves need attention, from the history they left behind.'}
      </Typography>
      <SignInForm onSignedIn={() => void navigate(next, { replace: true })} />
    </Box>
  );
}
