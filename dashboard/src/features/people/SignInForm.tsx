import { zodResolver } from '@hookform/resolvers/zod';
import { Box, Button, TextField, Typography } from '@mui/material';
import { signInDraft, type SignInDraft } from '@tailrace/shared/contracts/people';
import { useForm } from 'react-hook-form';
import { ProblemError } from '../../lib/problem-error';
import { signIn } from './api';

/** E-mail and password, and in plain words what was wrong with them. */
export function SignInForm({ onSignedIn }: { onSignedIn: () => void }) {
  const form = useForm<SignInDraft>({
    resolver: zodResolver(signInDraft),
    defaultValues: { email: '', password: '' },
  });
  const { errors, isSubmitting } = form.formState;

  const submit = form.handleSubmit(async (draft) => {
    try {
      await signIn(draft);
      onSignedIn();
    } catch (error) {
      const message =
        error instanceof ProblemError ? `${error.title}. ${error.detail}` : (error as Error).message;
      form.setError('root', { message });
      form.setFocus('password', { shouldSelect: true });
    }
  });

  return (
    <Box
      component="form"
      noValidate
      onSubmit={(event) => void submit(event)}
      sx={{ display: 'grid', gap: 2, maxWidth: 340 }}
    >
      <TextField
        label="E-mail"
        type="email"
        autoComplete="username"
        autoFocus
        error={Boolean(errors.email)}
        helperText={errors.email?.message}
        {...form.register('email')}
      />
      <TextField
        label="Password"
        type="password"
        autoComplete="current-password"
        error={Boolean(errors.password)}
        helperText={errors.password?.message}
        {...form.register('password')}
      />
      {errors.root && (
        <Typography role="alert" sx={{ pl: 1.5, borderLeft: '3px solid var(--tr-rust)' }}>
          {errors.root.message}
        </Typography>
      )}
      <Button type="submit" variant="contained" disabled={isSubmitting} sx={{ justifySelf: 'start' }}>
        Sign in
      </Button>
    </Box>
  );
}
