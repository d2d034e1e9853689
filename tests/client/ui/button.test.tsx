import { screen, waitFor } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';
import { Button } from '../../../src/components/ui/button';
import { LinkButton } from '../../../src/components/ui/link-button';
import { renderPart } from '../../support/render-app';

describe('a button', () => {
  it('acts when pressed by finger and by key', async () => {
    const pressed = vi.fn();
    const { user } = renderPart(<Button onPress={pressed}>Close load</Button>);
    const button = screen.getByRole('button', { name: 'Close load' });
    await user.click(button);
    button.focus();
    await user.keyboard('{Enter}');
    await user.keyboard(' ');
    expect(pressed).toHaveBeenCalledTimes(3);
  });

  it('that is blocked stays in reach, does nothing, and says why to the eye and the ear', async () => {
    const pressed = vi.fn();
    const { user } = renderPart(
      <Button onPress={pressed} blockedBecause="Count shelf 2 first.">
        Close load
      </Button>,
    );
    await user.tab();
    const button = screen.getByRole('button', { name: 'Close load' });
    expect(button).toHaveFocus();
    expect(button).toHaveAttribute('aria-disabled', 'true');
    expect(button).toBeEnabled();
    expect(button).toHaveAccessibleDescription('Count shelf 2 first.');
    await user.keyboard('{Enter}');
    expect(pressed).not.toHaveBeenCalled();
    const said = await screen.findAllByText('Count shelf 2 first.');
    expect(said.some((element) => element.closest('[aria-live="assertive"]') !== null)).toBe(true);
    await waitFor(() => {
      expect(document.querySelector('[data-placement] p')).toHaveTextContent('Count shelf 2 first.');
    });
  });

  it('that is blocked can lead to the block instead', async () => {
    const led = vi.fn();
    const { user } = renderPart(
      <Button blockedBecause="Turn slot 7." onBlockedPress={led}>
        Close load
      </Button>,
    );
    await user.click(screen.getByRole('button', { name: 'Close load' }));
    expect(led).toHaveBeenCalledTimes(1);
  });

  it('sends no form while it is blocked or waiting', async () => {
    const sent = vi.fn((event: { preventDefault: () => void }) => {
      event.preventDefault();
    });
    const { user } = renderPart(
      <form onSubmit={sent}>
        <Button type="submit" blockedBecause="Not yet.">
          Blocked
        </Button>
        <Button type="submit" waitingWords="Sending">
          Waiting
        </Button>
        <Button type="submit">Free</Button>
      </form>,
    );
    await user.click(screen.getByRole('button', { name: 'Blocked' }));
    await user.click(screen.getByRole('button', { name: 'Sending' }));
    expect(sent).not.toHaveBeenCalled();
    await user.click(screen.getByRole('button', { name: 'Free' }));
    expect(sent).toHaveBeenCalledTimes(1);
  });

  it('that waits says so in its own words and takes no second press', async () => {
    const pressed = vi.fn();
    const { user } = renderPart(
      <Button onPress={pressed} waitingWords="Signing in">
        Sign in
      </Button>,
    );
    await user.click(screen.getByRole('button', { name: 'Signing in' }));
    expect(pressed).not.toHaveBeenCalled();
  });

  it('that leads somewhere is a link', () => {
    renderPart(<LinkButton to="/pack">Pack</LinkButton>);
    expect(screen.getByRole('link', { name: 'Pack' })).toHaveAttribute('href', '/pack');
  });
});
