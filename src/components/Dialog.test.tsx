// @vitest-environment jsdom
import { render, screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState } from 'react';
import { expect, it } from 'vitest';
import { Dialog } from './Dialog.tsx';

function Page() {
  const [open, setOpen] = useState(false);
  return (
    <>
      <button onClick={() => setOpen(true)}>Delete</button>
      <Dialog open={open} onOpenChange={setOpen} title="Delete the film?">
        <button>Cancel</button>
      </Dialog>
    </>
  );
}

// WAI-ARIA Authoring Practices, modal dialog: when it closes, focus returns to the element that opened it.
it('leads the focus back to what opened it', async () => {
  render(<Page />);
  const opener = screen.getByRole('button', { name: 'Delete' });
  opener.focus();
  await userEvent.keyboard('{Enter}');
  await waitFor(() => expect(screen.getByRole('dialog').contains(document.activeElement)).toBe(true));
  await userEvent.keyboard('{Escape}');
  await waitFor(() => expect(document.activeElement).toBe(opener));
});
