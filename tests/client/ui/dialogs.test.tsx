import { screen, waitFor } from '@testing-library/react';
import { useState } from 'react';
import { describe, expect, it, vi } from 'vitest';
import { Button } from '../../../src/components/ui/button';
import { ConfirmDialog } from '../../../src/components/ui/confirm-dialog';
import { Dialog } from '../../../src/components/ui/dialog';
import { ProblemError } from '../../../src/lib/errors';
import { renderPart } from '../../support/render-app';

function Opener({ isClosable = true }: { isClosable?: boolean }) {
  const [isOpen, setIsOpen] = useState(false);
  const close = () => {
    setIsOpen(false);
  };
  return (
    <>
      <Button
        onPress={() => {
          setIsOpen(true);
        }}
      >
        Open
      </Button>
      <Dialog
        isOpen={isOpen}
        onClose={isClosable ? close : undefined}
        title="Slot 7"
        actions={<Button>Turn it</Button>}
      >
        Its film lies against the film of slot 6.
      </Dialog>
    </>
  );
}

describe('a dialog', () => {
  it('takes the focus, hides what is below, and gives the focus back', async () => {
    const { user } = renderPart(<Opener />);
    const opener = screen.getByRole('button', { name: 'Open' });
    await user.click(opener);
    const dialog = await screen.findByRole('dialog', { name: 'Slot 7' });
    expect(dialog).toContainElement(document.activeElement as HTMLElement);
    expect(screen.queryByRole('button', { name: 'Open' })).toBeNull();
    await user.keyboard('{Escape}');
    await waitFor(() => {
      expect(screen.queryByRole('dialog')).toBeNull();
    });
    await waitFor(() => {
      expect(opener).toHaveFocus();
    });
  });

  it('closes with its cross', async () => {
    const { user } = renderPart(<Opener />);
    await user.click(screen.getByRole('button', { name: 'Open' }));
    await user.click(await screen.findByRole('button', { name: 'Close' }));
    await waitFor(() => {
      expect(screen.queryByRole('dialog')).toBeNull();
    });
  });

  it('that has to be answered does not go away with Escape', async () => {
    const { user } = renderPart(<Opener isClosable={false} />);
    await user.click(screen.getByRole('button', { name: 'Open' }));
    await screen.findByRole('dialog');
    await user.keyboard('{Escape}');
    expect(screen.getByRole('dialog')).toBeVisible();
    expect(screen.queryByRole('button', { name: 'Close' })).toBeNull();
  });
});

type Confirm = (reason: string) => Promise<void>;

function renderQuestion(onConfirm: Confirm, isNeeded = true) {
  const onClose = vi.fn();
  const view = renderPart(
    <ConfirmDialog
      isOpen
      onClose={onClose}
      title="Let this finding stay?"
      confirmWords="Let it stay"
      waitingWords="Writing it down"
      reason={{ label: 'Why it may stay', isNeeded }}
      onConfirm={onConfirm}
    >
      X-33 is 12 mm from the side.
    </ConfirmDialog>,
  );
  return { ...view, onClose };
}

describe('a question', () => {
  it('does nothing without the reason it needs, and leads to it', async () => {
    const confirm = vi.fn<Confirm>(() => Promise.resolve());
    const { user } = renderQuestion(confirm);
    await user.click(await screen.findByRole('button', { name: 'Let it stay' }));
    const reason = screen.getByRole('textbox', { name: 'Why it may stay' });
    expect(reason).toBeInvalid();
    expect(reason).toHaveFocus();
    await user.type(reason, '   ');
    await user.click(screen.getByRole('button', { name: 'Let it stay' }));
    expect(confirm).not.toHaveBeenCalled();
  });

  it('hands the reason over, trimmed, and closes when it is done', async () => {
    const confirm = vi.fn<Confirm>(() => Promise.resolve());
    const { user, onClose } = renderQuestion(confirm);
    await user.type(await screen.findByRole('textbox'), ' The third holder is bent. ');
    await user.click(screen.getByRole('button', { name: 'Let it stay' }));
    expect(confirm).toHaveBeenCalledWith('The third holder is bent.');
    await waitFor(() => {
      expect(onClose).toHaveBeenCalledTimes(1);
    });
  });

  it('stays and says what the server refused', async () => {
    const { user, onClose } = renderQuestion(() =>
      Promise.reject(new ProblemError({ code: 'load.changed', status: 409, detail: 'Ines changed this load.' })),
    );
    await user.type(await screen.findByRole('textbox'), 'Bent.');
    await user.click(screen.getByRole('button', { name: 'Let it stay' }));
    expect(await screen.findByText('Ines changed this load.')).toBeVisible();
    expect(screen.getByRole('button', { name: 'Let it stay' })).toHaveAttribute('aria-disabled', 'false');
    expect(onClose).not.toHaveBeenCalled();
  });

  it('asks once: a second press while it is being done does nothing', async () => {
    let finish: () => void = () => undefined;
    const confirm = vi.fn<Confirm>(
      () =>
        new Promise((resolve) => {
          finish = resolve;
        }),
    );
    const { user, onClose } = renderQuestion(confirm, false);
    await user.click(await screen.findByRole('button', { name: 'Let it stay' }));
    await user.click(screen.getByRole('button', { name: 'Writing it down' }));
    await user.keyboard('{Escape}');
    expect(onClose).not.toHaveBeenCalled();
    finish();
    await waitFor(() => {
      expect(onClose).toHaveBeenCalled();
    });
    expect(confirm).toHaveBeenCalledTimes(1);
  });
});
