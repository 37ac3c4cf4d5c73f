import { act, fireEvent, render, screen } from '@testing-library/react';
import { ToastProvider, useToast, type Toast } from '@/components/ui/toast';

function Shower({ toast }: { toast: Toast }) {
  const { show } = useToast();
  return <button onClick={() => show(toast)}>show</button>;
}

function showToast(toast: Toast): void {
  render(
    <ToastProvider>
      <Shower toast={toast} />
    </ToastProvider>,
  );
  fireEvent.click(screen.getByText('show'));
}

describe('toasts', () => {
  beforeEach(() => jest.useFakeTimers());
  afterEach(() => jest.useRealTimers());

  it('are read out politely and go by themselves', () => {
    showToast({ text: 'Draft saved' });
    expect(screen.getByRole('status').textContent).toBe('Draft saved');
    act(() => jest.advanceTimersByTime(6_000));
    expect(screen.getByRole('status').textContent).toBe('');
  });

  it('stay while they have the focus, and go when their action is taken', () => {
    const onPress = jest.fn();
    showToast({ text: 'Fill taken out', action: { label: 'Undo', onPress } });
    const undo = screen.getByRole('button', { name: 'Undo' });
    act(() => undo.focus());
    act(() => jest.advanceTimersByTime(60_000));
    fireEvent.click(undo);
    expect(onPress).toHaveBeenCalledTimes(1);
    expect(screen.getByRole('status').textContent).toBe('');
  });
});
