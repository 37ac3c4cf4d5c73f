import { fireEvent, render, screen } from '@testing-library/react';
import { EmptyState, ErrorState, LoadingState } from '@/components/ui/states';
import { ApiError } from '@/hooks/client/api-error';

const refusal = (code: ApiError['code']) =>
  new ApiError({ code, message: 'The price file was not kept.', action: 'Send it again.', problems: [] });

describe('ErrorState', () => {
  it('says what happened and what to do in the words of the server, as an alert with a way to try again', () => {
    const onRetry = jest.fn();
    render(<ErrorState error={refusal('unavailable')} onRetry={onRetry} />);
    expect(screen.getByRole('alert').textContent).toContain('The price file was not kept. Send it again.');
    fireEvent.click(screen.getByRole('button', { name: 'Try again' }));
    expect(onRetry).toHaveBeenCalledTimes(1);
  });

  it('keeps the details of an unforeseen error from the reader', () => {
    render(<ErrorState error={new Error('x is undefined')} />);
    expect(screen.getByRole('alert').textContent).not.toContain('undefined');
  });

  it('shows no way to try again when the reader may not do it', () => {
    render(<ErrorState error={refusal('not-allowed')} onRetry={() => undefined} />);
    expect(screen.getByRole('heading', { name: 'The price file was not kept.' })).toBeTruthy();
    expect(screen.queryByRole('button')).toBeNull();
  });
});

describe('LoadingState', () => {
  it('tells screen readers what is loading and hides its shapes from them', () => {
    render(<LoadingState label="Loading entries" />);
    const status = screen.getByRole('status');
    expect(status.textContent).toBe('Loading entries');
    expect(status.getAttribute('aria-busy')).toBe('true');
  });
});

describe('EmptyState', () => {
  it('offers the next action', () => {
    const onPress = jest.fn();
    render(
      <EmptyState
        title="No entries yet"
        text="An entry starts as a plan."
        action={{ label: 'Plan a trade', onPress }}
      />,
    );
    fireEvent.click(screen.getByRole('button', { name: 'Plan a trade' }));
    expect(onPress).toHaveBeenCalledTimes(1);
  });
});
