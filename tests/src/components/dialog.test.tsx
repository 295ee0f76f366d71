// @vitest-environment happy-dom
import { cleanup, fireEvent, render, screen, waitFor } from '@testing-library/react';
import { useState } from 'react';
import { afterEach, describe, expect, it } from 'vitest';
import { ConfirmDialog } from '../../../src/components/confirm-dialog';
import { Dialog } from '../../../src/components/dialog';
import { LengthField } from '../../../src/components/length-field';

afterEach(cleanup);

function Bench() {
  const [isOpen, setOpen] = useState(false);
  const [mm, setMm] = useState(25.4);
  return (
    <>
      <button onClick={() => setOpen(true)}>set out</button>
      <Dialog open={isOpen} onOpenChange={setOpen} title="Set out">
        <LengthField label="pad height" value={mm} onCommit={setMm} display="in" />
      </Dialog>
    </>
  );
}

describe('a dialog', () => {
  it('leaves Esc to a field that is being typed in, then closes and gives the focus back', async () => {
    render(<Bench />);
    const opener = screen.getByText('set out');
    opener.focus();
    fireEvent.click(opener);
    const field = screen.getByLabelText<HTMLInputElement>('pad height');
    fireEvent.change(field, { target: { value: '7' } });
    fireEvent.keyDown(field, { key: 'Escape' });
    expect(screen.queryByRole('dialog')).not.toBeNull();
    expect(field.value).toBe('1');
    fireEvent.keyDown(field, { key: 'Escape' });
    expect(screen.queryByRole('dialog')).toBeNull();
    await waitFor(() => expect(document.activeElement).toBe(opener));
  });
});

describe('a question before a deed that cannot be undone', () => {
  it('waits for the name, and forgets it when it is closed', () => {
    let deeds = 0;
    const ask = (open: boolean) => (
      <ConfirmDialog
        open={open}
        onOpenChange={() => undefined}
        title="Delete?"
        action="Delete the team"
        typed={{ label: 'Name', text: 'Quay' }}
        onConfirm={() => (deeds += 1)}
      >
        <p>For good.</p>
      </ConfirmDialog>
    );
    const { rerender } = render(ask(true));
    const confirm = () => screen.getByRole<HTMLButtonElement>('button', { name: 'Delete the team' });
    fireEvent.submit(screen.getByLabelText('Name').closest('form')!);
    expect(deeds).toBe(0);
    fireEvent.change(screen.getByLabelText('Name'), { target: { value: 'Quay' } });
    expect(confirm().disabled).toBe(false);
    fireEvent.submit(screen.getByLabelText('Name').closest('form')!);
    expect(deeds).toBe(1);
    rerender(ask(false));
    rerender(ask(true));
    expect(confirm().disabled).toBe(true);
  });
});
