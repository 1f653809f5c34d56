import { cleanup, render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState } from 'react';
import { afterEach, describe, expect, it, vi } from 'vitest';
import '../charts/browser-stubs.ts';
import { Button } from '#src/components/button.tsx';
import { Dialog } from '#src/components/dialog.tsx';
import { Field } from '#src/components/field.tsx';
import { Term } from '#src/components/term.tsx';
import { Textarea } from '#src/components/textarea.tsx';
import { ToastProvider, useToast } from '#src/components/toast.tsx';

afterEach(cleanup);

function Rejecting() {
  const [open, setOpen] = useState(false);
  return (
    <>
      <Button onClick={() => setOpen(true)}>Reject</Button>
      <Dialog open={open} onOpenChange={setOpen} title="Reject this flag">
        <Field label="Reason">
          <Textarea />
        </Field>
      </Dialog>
    </>
  );
}

describe('Dialog', () => {
  it('opens on its first field, closes on Escape and gives the focus back', async () => {
    render(<Rejecting />);
    const opener = screen.getByRole('button', { name: 'Reject' });
    await userEvent.click(opener);
    const dialog = screen.getByRole('dialog', { name: 'Reject this flag' });
    expect(document.activeElement).toBe(within(dialog).getByRole('textbox', { name: 'Reason' }));
    await userEvent.keyboard('{Escape}');
    expect(screen.queryByRole('dialog')).toBeNull();
    await vi.waitFor(() => expect(document.activeElement).toBe(opener));
  });
});

describe('Term', () => {
  it('explains a word where it stands', async () => {
    render(<Term definition="A multiple of the speed of rotation.">order</Term>);
    expect(screen.queryByText('A multiple of the speed of rotation.')).toBeNull();
    await userEvent.click(screen.getByRole('button', { name: 'order: what it means' }));
    screen.getByText('A multiple of the speed of rotation.');
  });
});

function Telling({ onUndo }: { onUndo: () => void }) {
  const notify = useToast();
  return (
    <>
      <Button
        onClick={() =>
          notify({ text: 'Flag accepted.', action: { label: 'Undo', onAction: onUndo } })
        }
      >
        Accept
      </Button>
      <Button onClick={() => notify({ text: 'Not saved.', failed: true })}>Fail</Button>
    </>
  );
}

describe('a message', () => {
  it('offers the way back and goes when it is taken', async () => {
    const onUndo = vi.fn();
    render(
      <ToastProvider>
        <Telling onUndo={onUndo} />
      </ToastProvider>,
    );
    await userEvent.click(screen.getByRole('button', { name: 'Accept' }));
    await userEvent.click(await screen.findByRole('button', { name: 'Undo' }));
    expect(onUndo).toHaveBeenCalledOnce();
    await vi.waitFor(() => expect(screen.queryByRole('button', { name: 'Undo' })).toBeNull());
  });

  it('says of a failure that it is one', async () => {
    render(
      <ToastProvider>
        <Telling onUndo={() => undefined} />
      </ToastProvider>,
    );
    await userEvent.click(screen.getByRole('button', { name: 'Fail' }));
    const shown = await screen.findByText('Failed:');
    expect(shown.parentElement?.textContent).toBe('Failed:Not saved.');
  });
});
