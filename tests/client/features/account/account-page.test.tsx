import { cleanup, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { mailKinds, type MailChoicesResponse } from '#shared/contracts/mail.ts';
import { aSession } from '#tests/support/client-fixtures.ts';
import { refusal, renderPage } from '#tests/support/render-page.tsx';

afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

const choices = (off: readonly string[] = []): MailChoicesResponse => ({
  email: 'ada@plant.example',
  choices: mailKinds.map((kind) => ({ kind, wanted: !off.includes(kind) })),
});

const openAccount = (extra: Parameters<typeof renderPage>[1] = {}) =>
  renderPage('/account', {
    'GET /api/session': aSession('owner'),
    'GET /api/account/mail': choices(),
    ...extra,
  });

describe('the account page', () => {
  it('switches off a kind of mail at once and says what it means for new inspections', async () => {
    const { sent } = openAccount({ 'PUT /api/account/mail': choices(['assigned']) });
    const user = userEvent.setup();
    const box = await screen.findByRole('checkbox', { name: 'An inspection is assigned to me' });
    expect(screen.queryByRole('note')).toBeNull();
    await user.click(box);
    expect(sent).toEqual([
      { call: 'PUT /api/account/mail', body: { kind: 'assigned', wanted: false } },
    ]);
    const note = await screen.findByRole('note');
    expect(within(note).getByText(/The task is yours all the same/)).toBeTruthy();
    expect((box as HTMLInputElement).checked).toBe(false);
  });

  it('changes the password only where it was typed the same twice', async () => {
    const { sent } = openAccount({
      'POST /api/session/password': () => new Response(null, { status: 204 }),
    });
    const user = userEvent.setup();
    await user.type(await screen.findByLabelText('Present password'), 'the old password');
    await user.type(screen.getByLabelText('New password'), 'a long new password');
    await user.type(screen.getByLabelText('New password again'), 'a long new passwort');
    const button = screen.getByRole('button', { name: 'Change password' });
    await user.click(button);
    expect(await screen.findByText('This is not the same as the new password.')).toBeTruthy();
    expect(sent).toEqual([]);
    await user.clear(screen.getByLabelText('New password again'));
    await user.type(screen.getByLabelText('New password again'), 'a long new password');
    await user.click(button);
    expect(await screen.findByText('The password is changed.')).toBeTruthy();
    expect(sent).toEqual([
      {
        call: 'POST /api/session/password',
        body: { currentPassword: 'the old password', newPassword: 'a long new password' },
      },
    ]);
  });

  it('says at its field that the present password is wrong, and keeps what was typed', async () => {
    const message = 'This is not your present password.';
    openAccount({
      'POST /api/session/password': () =>
        Response.json(
          {
            error: {
              code: 'validation',
              message,
              id: 'test',
              fields: [{ path: 'currentPassword', message }],
            },
          },
          { status: 422 },
        ),
    });
    const user = userEvent.setup();
    const present = await screen.findByLabelText('Present password');
    await user.type(present, 'wrong');
    await user.type(screen.getByLabelText('New password'), 'a long new password');
    await user.type(screen.getByLabelText('New password again'), 'a long new password');
    await user.click(screen.getByRole('button', { name: 'Change password' }));
    expect(await screen.findByText(message)).toBeTruthy();
    expect(present.getAttribute('aria-invalid')).toBe('true');
    expect((present as HTMLInputElement).value).toBe('wrong');
  });
});

describe('the page behind an unsubscribe link', () => {
  const standing = 'GET /api/unsubscribe/7.weekly.abc/standing';

  it('does nothing until its button is pressed', async () => {
    const { sent } = renderPage('/unsubscribe/7.weekly.abc', {
      [standing]: { kind: 'weekly', wanted: true },
      'POST /api/unsubscribe/7.weekly.abc': { kind: 'weekly', wanted: false },
    });
    const button = await screen.findByRole('button', { name: 'No more mails of this kind' });
    expect(sent).toEqual([]);
    await userEvent.setup().click(button);
    const told = await screen.findByText(/^You get no more mails of this kind/);
    expect(told.textContent).toContain('Weekly summary of a site');
    expect(screen.queryByRole('button', { name: 'No more mails of this kind' })).toBeNull();
  });

  it('says so where the link does not work', async () => {
    renderPage('/unsubscribe/7.weekly.abc', {
      [standing]: () => refusal(404, 'not_found', 'This link does not exist.'),
    });
    expect(await screen.findByText('This link does not work')).toBeTruthy();
    expect(screen.queryByRole('button', { name: /No more/ })).toBeNull();
  });
});
