import { render, screen, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { ProofStripe, TinyProofStripe, type Stretch } from '../../../src/components/proof-stripe';

const stretches: readonly Stretch[] = [
  { label: 'Air removal', state: 'proven', words: 'passed 05:48' },
  { label: 'Loading', state: 'waiting', words: '24 of 33 scanned', share: 1.5 },
  { label: 'Cycle', state: 'not-yet' },
  { label: 'External CI', state: 'look-again', words: 'pale bar' },
  { label: 'PCD', state: 'failed', words: 'CI did not turn' },
  { label: 'BI', state: 'not-asked' },
  { label: 'Implants', state: 'by-exception', words: '2 early, 10:43' },
];

describe('the proof stripe', () => {
  it.each(['full', 'upright'] as const)('says each requirement with its state in words when %s', (form) => {
    render(<ProofStripe stretches={stretches} form={form} label="Proof of 3-26076-03" />);
    const items = within(screen.getByRole('list', { name: 'Proof of 3-26076-03' })).getAllByRole('listitem');
    expect(items.map((item) => item.textContent)).toEqual([
      'Air removalpassed 05:48, proven',
      'Loading24 of 33 scanned, waiting',
      'Cyclenot yet',
      'External CIpale bar, look again',
      'PCDCI did not turn, failed',
      'BInot asked',
      'Implants2 early, 10:43, by exception',
    ]);
  });

  it('welds a stretch that is proven before one’s eyes, once, and none that was proven already', () => {
    const { rerender } = render(<ProofStripe stretches={stretches} />);
    const welding = () =>
      screen
        .getAllByRole('listitem')
        .filter((item) => item.classList.contains('animate-weld'))
        .map((item) => item.querySelector('b')?.textContent);
    expect(welding()).toEqual([]);
    const cycle = { label: 'Cycle', state: 'proven', words: 'hold 4:12' } as const;
    rerender(<ProofStripe stretches={stretches.map((one) => (one.label === 'Cycle' ? cycle : one))} />);
    expect(welding()).toEqual(['Cycle']);
  });

  it('shakes a stretch that tears', () => {
    const { rerender } = render(<ProofStripe stretches={[{ label: 'BI', state: 'proven' }]} />);
    rerender(<ProofStripe stretches={[{ label: 'BI', state: 'failed', words: 'grew' }]} />);
    expect(screen.getByRole('listitem')).toHaveClass('animate-tear');
  });

  it('when tiny is for the eye only', () => {
    const { container } = render(<TinyProofStripe states={['proven', 'waiting']} />);
    expect(container.firstElementChild).toHaveAttribute('aria-hidden', 'true');
  });
});
