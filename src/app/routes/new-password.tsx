import type { QueryClient } from '@tanstack/react-query';
import { useSuspenseQuery } from '@tanstack/react-query';
import { redirect, useNavigate, type LoaderFunction } from 'react-router-dom';
import { NewPasswordScreen } from '../../features/session/components/new-password-screen';
import { sessionQueries } from '../../features/session/queries';
import { isProblem } from '../../lib/errors';

export const loader =
  (queryClient: QueryClient): LoaderFunction =>
  async () => {
    try {
      await queryClient.query({ ...sessionQueries.current(), staleTime: 'static' });
      return null;
    } catch (error) {
      if (isProblem(error) && error.httpStatus === 401) return redirect('/sign-in');
      throw error;
    }
  };

export function Component() {
  const { data: session } = useSuspenseQuery(sessionQueries.current());
  const navigate = useNavigate();
  const because = session.person.mustChangePassword ? 'one-time' : 'own';
  return (
    <NewPasswordScreen
      personName={session.person.displayName}
      because={because}
      onDone={() => {
        void navigate('/', { replace: true });
      }}
      onLeave={() => {
        void navigate(because === 'one-time' ? '/sign-in' : '/', { replace: true });
      }}
    />
  );
}
