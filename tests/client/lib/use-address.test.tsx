import { act, fireEvent, render, screen, waitFor } from '@testing-library/react';
import { createMemoryRouter, RouterProvider } from 'react-router-dom';
import { describe, expect, it } from 'vitest';
import { useAddress } from '../../../src/lib/use-address';

function Screen() {
  const { params, write } = useAddress();
  return (
    <>
      <input
        aria-label="Search"
        value={params.get('search') ?? ''}
        onChange={(event) => {
          write({ search: event.target.value });
        }}
      />
      <output>{params.toString()}</output>
      <button
        type="button"
        onClick={() => {
          write({ role: 'lead' });
          write({ page: '2' });
        }}
      >
        Two changes
      </button>
      <button
        type="button"
        onClick={() => {
          write({ open: 'one' }, true);
        }}
      >
        A new step
      </button>
    </>
  );
}

/** A router that takes its time: each change of the address waits until it is let through. */
function openSlowly(address: string) {
  const waiting: (() => void)[] = [];
  const router = createMemoryRouter(
    [
      {
        path: '/',
        element: <Screen />,
        hydrateFallbackElement: <p>Waiting</p>,
        loader: () =>
          new Promise((resolve) => {
            waiting.push(() => {
              resolve(null);
            });
          }),
      },
    ],
    { initialEntries: [address] },
  );
  render(<RouterProvider router={router} />);
  const letThrough = async () => {
    await act(async () => {
      for (const go of waiting.splice(0)) go();
      await Promise.resolve();
    });
  };
  return { router, letThrough };
}

async function shown(text: string) {
  await waitFor(() => {
    expect(screen.getByRole('status')).toHaveTextContent(text);
  });
}

describe('what a screen keeps in its address', () => {
  it('keeps both of two changes made right after each other', async () => {
    const { router, letThrough } = openSlowly('/?search=mayo');
    await letThrough();
    fireEvent.click(await screen.findByRole('button', { name: 'Two changes' }));
    await letThrough();
    await waitFor(() => {
      expect(router.state.location.search).toBe('?search=mayo&role=lead&page=2');
    });
  });

  it('shows what is typed at once, however long the router takes, and loses no letter', async () => {
    const { router, letThrough } = openSlowly('/');
    await letThrough();
    const field = await screen.findByLabelText('Search');
    for (const text of ['m', 'ma', 'may']) {
      fireEvent.change(field, { target: { value: text } });
      expect(field).toHaveValue(text);
    }
    fireEvent.click(screen.getByRole('button', { name: 'Two changes' }));
    await letThrough();
    await waitFor(() => {
      expect(router.state.location.search).toBe('?search=may&role=lead&page=2');
    });
    expect(field).toHaveValue('may');
  });

  it('goes back where a new step was taken, and follows a link', async () => {
    const { router, letThrough } = openSlowly('/?search=mayo');
    await letThrough();
    fireEvent.click(await screen.findByRole('button', { name: 'A new step' }));
    await letThrough();
    await shown('search=mayo&open=one');
    await act(async () => {
      void router.navigate(-1);
      await Promise.resolve();
    });
    await letThrough();
    await shown('search=mayo');
    expect(screen.getByRole('status')).not.toHaveTextContent('open');
    await act(async () => {
      void router.navigate('/?search=kelly');
      await Promise.resolve();
    });
    await letThrough();
    await waitFor(() => {
      expect(screen.getByLabelText('Search')).toHaveValue('kelly');
    });
  });
});
