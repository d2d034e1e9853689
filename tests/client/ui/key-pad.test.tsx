import { screen } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';
import { CountPad, PinPad } from '../../../src/components/ui/key-pad';
import { useScanner } from '../../../src/lib/scanner-input';
import { renderPart } from '../../support/render-app';
import { pause, wedge } from '../../support/scanner';

describe('the pad for a PIN', () => {
  it('takes digits from the pad and from a keyboard, hidden, and hands them over with Enter', async () => {
    const done = vi.fn();
    const { user } = renderPart(<PinPad label="PIN" doneWords="Sign in" onDone={done} leastDigits={6} />);
    const field = screen.getByLabelText('PIN');
    expect(field).toHaveFocus();
    expect(field).toHaveAttribute('type', 'password');
    for (const digit of ['8', '0', '5']) await user.click(screen.getByRole('button', { name: digit }));
    await user.click(screen.getByRole('button', { name: 'Take the last digit back' }));
    field.focus();
    await user.keyboard('1x739');
    expect(field).toHaveValue('801739');
    await pause();
    await user.keyboard('{Enter}');
    expect(done).toHaveBeenCalledWith('801739');
    expect(field).toHaveValue('');
  });

  it('says how many digits are wanted instead of trying with fewer', async () => {
    const done = vi.fn();
    const { user } = renderPart(<PinPad label="PIN" doneWords="Sign in" onDone={done} leastDigits={6} />);
    await user.keyboard('80{Enter}');
    const button = screen.getByRole('button', { name: 'Sign in' });
    expect(button).toHaveAccessibleDescription('A PIN has 6 digits or more.');
    await user.click(button);
    expect(done).not.toHaveBeenCalled();
  });

  it('keeps a badge that is scanned meanwhile out of its field', async () => {
    const scanned = vi.fn();
    function Sheet() {
      useScanner((scan) => {
        scanned(scan.text);
      });
      return <PinPad label="PIN" doneWords="Sign in" onDone={vi.fn()} />;
    }
    const { user } = renderPart(<Sheet />);
    await user.keyboard('80');
    wedge('N4812093796');
    expect(scanned).toHaveBeenCalledWith('N4812093796');
    expect(screen.getByLabelText('PIN')).toHaveValue('80');
  });
});

describe('the pad for a count', () => {
  it('hands over a number, nought as well, and nothing while nothing was typed', async () => {
    const done = vi.fn();
    const { user } = renderPart(<CountPad label="Pieces on shelf 2" doneWords="Keep the count" onDone={done} />);
    await user.click(screen.getByRole('button', { name: 'Keep the count' }));
    expect(done).not.toHaveBeenCalled();
    await user.click(screen.getByRole('button', { name: '0' }));
    await user.click(screen.getByRole('button', { name: 'Keep the count' }));
    expect(done).toHaveBeenLastCalledWith(0);
    await user.click(screen.getByRole('button', { name: 'Clear' }));
    for (const digit of ['2', '6']) await user.click(screen.getByRole('button', { name: digit }));
    await user.click(screen.getByRole('button', { name: 'Keep the count' }));
    expect(done).toHaveBeenLastCalledWith(26);
  });

  it('takes no more digits than a count can have', async () => {
    const { user } = renderPart(<CountPad label="Pieces" doneWords="Keep" onDone={vi.fn()} mostDigits={4} />);
    await user.keyboard('123456');
    expect(screen.getByRole('textbox', { name: 'Pieces' })).toHaveValue('1234');
  });
});
