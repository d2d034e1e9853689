import type { QueryClient } from '@tanstack/react-query';
import { redirect, useNavigate, useSearchParams, type LoaderFunction } from 'react-router-dom';
import { SignInScreen } from '../../features/session/components/sign-in-screen';
import { sessionQueries } from '../../features/session/queries';
import { isProblem } from '../../lib/errors';
import { addressWithin } from '../address-within';

/** Who is signed in already has no need of this screen. */
export const loader =
  (queryClient: QueryClient): LoaderFunction =>
  async ({ request }) => {
    try {
      await queryClient.query({ ...sessionQueries.current(), staleTime: 'static' });
    } catch (error) {
      // Nobody is: that is what this screen is for. Silence too: it shows, and says so when tried.
      if (isProblem(error) && error.httpStatus !== 401) throw error;
      return null;
    }
    return redirect(addressWithin(new URL(request.url).searchParams.get('next')));
  };

export function Component() {
  const navigate = useNavigate();
  const [search] = useSearchParams();
  return (
    <SignInScreen
      onSignedIn={(session) => {
        void navigate(session.person.mustChangePassword ? '/new-password' : addressWithin(search.get('next')), {
          replace: true,
        });
      }}
    />
  );
}
