import { screen, waitFor } from '@testing-library/react';
import { userEvent } from '@testing-library/user-event';
import { describe, expect, it, vi } from 'vitest';
import { ReleaseDialog, WithdrawDialog } from '#client/versions/release-dialog.tsx';
import { fakeServer, json, problem, releasedBy, sectionId, sectionOf, show, versionOf } from './support.tsx';

const section = `GET /api/sections/${sectionId}`;
const release = `POST /api/sections/${sectionId}/versions/4/release`;
const withdraw = `POST /api/sections/${sectionId}/versions/3/withdraw`;

describe('ReleaseDialog', () => {
  it('says which version it supersedes, sends the reason and closes', async () => {
    const released = versionOf(4, { status: 'released', ...releasedBy });
    const requests = fakeServer({ [section]: () => json(sectionOf()), [release]: () => json(released) });
    const onClose = vi.fn();
    show(<ReleaseDialog version={versionOf(4)} onClose={onClose} />);
    expect(await screen.findByText(/Version 3, in force now, will be superseded/)).toBeTruthy();
    await userEvent.type(screen.getByLabelText(/Why it is good to cut/), 'Test panel flew well');
    await userEvent.click(screen.getByRole('button', { name: 'Release version 4' }));
    await waitFor(() => expect(onClose).toHaveBeenCalledOnce());
    expect(requests.find(({ method }) => method === 'POST')?.body).toEqual({
      reason: 'Test panel flew well',
    });
  });

  it('keeps what was typed when the server says no', async () => {
    fakeServer({ [section]: () => json(sectionOf()), [release]: () => problem(409, 'Already released.') });
    const onClose = vi.fn();
    show(<ReleaseDialog version={versionOf(4)} onClose={onClose} />);
    const reason = screen.getByLabelText<HTMLTextAreaElement>(/Why it is good to cut/);
    await userEvent.type(reason, 'Flew well');
    await userEvent.click(screen.getByRole('button', { name: 'Release version 4' }));
    expect((await screen.findByRole('alert')).textContent).toMatch(/Already released\. Nothing was changed/);
    expect(reason.value).toBe('Flew well');
    expect(onClose).not.toHaveBeenCalled();
  });
});

describe('WithdrawDialog', () => {
  const version = versionOf(3, { status: 'released', ...releasedBy });

  it('does not go without a reason', async () => {
    const requests = fakeServer({ [section]: () => json(sectionOf()) });
    show(<WithdrawDialog version={version} onClose={vi.fn()} />);
    await userEvent.click(screen.getByRole('button', { name: 'Withdraw version 3' }));
    expect(await screen.findByText('Say why the version is withdrawn.')).toBeTruthy();
    expect(requests.filter(({ method }) => method === 'POST')).toEqual([]);
  });

  it('sends the reason', async () => {
    const requests = fakeServer({ [withdraw]: () => json({ ...version, status: 'withdrawn' }) });
    const onClose = vi.fn();
    show(<WithdrawDialog version={version} onClose={onClose} />);
    await userEvent.type(screen.getByLabelText('Why it is withdrawn'), 'Spar tube clashes');
    await userEvent.click(screen.getByRole('button', { name: 'Withdraw version 3' }));
    await waitFor(() => expect(onClose).toHaveBeenCalledOnce());
    expect(requests[0]?.body).toEqual({ reason: 'Spar tube clashes' });
  });
});
