import { act, fireEvent, render, screen } from '@testing-library/react';
import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';

function Page({ onClose = () => undefined }: { onClose?: () => void }) {
  const [isOpen, setIsOpen] = useState(false);
  const close = () => {
    onClose();
    setIsOpen(false);
  };
  return (
    <>
      <Button label="Seal" onPress={() => setIsOpen(true)} />
      {isOpen ? (
        <Dialog
          title="Seal this forecast?"
          onClose={close}
          actions={
            <>
              <Button label="Keep editing" onPress={close} />
              <Button label="Not now" disabled />
              <Button label="Seal forecast" onPress={close} />
            </>
          }
        />
      ) : null}
    </>
  );
}

function open(onClose?: () => void) {
  render(<Page onClose={onClose} />);
  const opener = screen.getByRole('button', { name: 'Seal' });
  act(() => opener.focus());
  fireEvent.click(opener);
  return {
    opener,
    dialog: screen.getByRole('dialog', { name: 'Seal this forecast?' }),
    first: screen.getByRole('button', { name: 'Keep editing' }),
    last: screen.getByRole('button', { name: 'Seal forecast' }),
  };
}

describe('Dialog', () => {
  it('is a modal dialog named by its title, with the focus on its first control', () => {
    const { dialog, first } = open();
    expect(dialog.getAttribute('aria-modal')).toBe('true');
    expect(document.activeElement).toBe(first);
  });

  it('keeps Tab inside: after the last control comes the first, before the first the last', () => {
    const { first, last } = open();
    act(() => last.focus());
    fireEvent.keyDown(last, { key: 'Tab' });
    expect(document.activeElement).toBe(first);
    fireEvent.keyDown(first, { key: 'Tab', shiftKey: true });
    expect(document.activeElement).toBe(last);
  });

  it('closes once on Escape and gives the focus back to what opened it', () => {
    const onClose = jest.fn();
    const { opener, first } = open(onClose);
    fireEvent.keyDown(first, { key: 'Escape' });
    expect(onClose).toHaveBeenCalledTimes(1);
    expect(screen.queryByRole('dialog')).toBeNull();
    expect(document.activeElement).toBe(opener);
  });

  it('stays open when the page beside it is pressed', () => {
    const { dialog } = open();
    fireEvent.click(dialog);
    expect(screen.queryByRole('dialog')).not.toBeNull();
  });
});
