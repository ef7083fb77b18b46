import { render } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { RouterProvider } from 'react-router-dom';
import { Providers } from './app/providers';
import { openRouterAt } from './app/router';

/** Opens the whole dashboard at an address, as a person's browser would; the plant answers. */
export function openAt(address: string) {
  const router = openRouterAt(address);
  render(
    <Providers>
      <RouterProvider router={router} />
    </Providers>,
  );
  return {
    user: userEvent.setup(),
    /** where the browser is now */
    where: () => router.state.location.pathname + router.state.location.search,
  };
}
