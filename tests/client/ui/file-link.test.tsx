import { screen, waitFor } from '@testing-library/react';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { FileLink } from '../../../src/components/ui/file-link';
import { signedOutGate } from '../../../src/lib/signed-out-gate';
import { nobody, renderPart } from '../../support/render-app';
import { stubServer, type Answer } from '../../support/server-stub';

const csv: Answer = {
  text: 'code,name\r\nW-01,Minor set\r\n',
  status: 200,
  contentType: 'text/csv; charset=utf-8',
  headers: { 'Content-Disposition': 'inline; filename="items.csv"' },
};

const address = 'blob:the-file';
let saved: { href: string; name: string }[] = [];
let kept: Blob[] = [];

beforeEach(() => {
  saved = [];
  kept = [];
  // jsdom keeps no files and goes nowhere.
  vi.stubGlobal(
    'URL',
    Object.assign(URL, {
      createObjectURL: (file: Blob) => {
        kept.push(file);
        return address;
      },
      revokeObjectURL: () => undefined,
    }),
  );
  vi.spyOn(HTMLAnchorElement.prototype, 'click').mockImplementation(function (this: HTMLAnchorElement) {
    saved.push({ href: this.href, name: this.download });
  });
});

afterEach(() => {
  signedOutGate.leave();
});

function openLink(how: 'open' | 'save', answer: () => Answer) {
  const server = stubServer({ 'GET /api/items/export': answer });
  const view = renderPart(
    <FileLink to="/api/items/export" how={how}>
      Save as CSV
    </FileLink>,
  );
  return { server, link: screen.getByRole('link', { name: 'Save as CSV' }), ...view };
}

describe('a link to a file of the server', () => {
  it('saves it under the name the server gives it', async () => {
    const { user, link } = openLink('save', () => csv);
    await user.click(link);
    await waitFor(() => {
      expect(saved).toEqual([{ href: address, name: 'items.csv' }]);
    });
    expect(await kept[0]?.text()).toBe('code,name\r\nW-01,Minor set\r\n');
  });

  it('tells a refusal in words and saves nothing', async () => {
    const { user, link } = openLink('save', () => ({
      problem: 'access.not-permitted',
      status: 403,
      detail: 'Your role does not allow this.',
    }));
    await user.click(link);
    expect(await screen.findByText('Your role does not allow this.')).toBeVisible();
    expect(saved).toEqual([]);
  });

  it('waits for a sign-in when the one before has ended, then saves what was asked for', async () => {
    let isSignedIn = false;
    signedOutGate.signedIn('somebody');
    const { user, link, server } = openLink('save', () => (isSignedIn ? csv : nobody));
    await user.click(link);
    await waitFor(() => {
      expect(signedOutGate.isClosed.get()).toBe(true);
    });
    expect(saved).toEqual([]);
    // Pressed once more, it is not asked for twice.
    await user.click(link);
    expect(server.callsTo('GET', '/api/items/export')).toHaveLength(1);
    isSignedIn = true;
    signedOutGate.signedIn('somebody');
    await waitFor(() => {
      expect(saved).toHaveLength(1);
    });
  });

  it('says it when nobody signs in again', async () => {
    signedOutGate.signedIn('somebody');
    const { user, link } = openLink('save', () => nobody);
    await user.click(link);
    await waitFor(() => {
      expect(signedOutGate.isClosed.get()).toBe(true);
    });
    signedOutGate.leave();
    expect(await screen.findByText('Nobody is signed in here.')).toBeVisible();
    expect(saved).toEqual([]);
  });

  it('opens a sheet in a tab of its own, and saves it where the browser opens none', async () => {
    const open = vi.fn<() => unknown>(() => ({}));
    vi.stubGlobal('open', open);
    const { user, link } = openLink('open', () => csv);
    await user.click(link);
    await waitFor(() => {
      expect(open).toHaveBeenCalledWith(address, '_blank');
    });
    expect(saved).toEqual([]);
    open.mockReturnValue(null);
    await user.click(link);
    await waitFor(() => {
      expect(saved).toEqual([{ href: address, name: 'items.csv' }]);
    });
  });

  it('opens no tab for a refusal', async () => {
    const open = vi.fn();
    vi.stubGlobal('open', open);
    const { user, link } = openLink('open', () => ({
      problem: 'people.no-badge',
      status: 404,
      detail: 'This person has no badge.',
    }));
    await user.click(link);
    expect(await screen.findByText('This person has no badge.')).toBeVisible();
    expect(open).not.toHaveBeenCalled();
  });
});
