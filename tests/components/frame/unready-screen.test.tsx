import { fireEvent, screen } from '@testing-library/react';
import { UnreadyScreen } from '@/components/frame/unready-screen';
import { ApiError } from '@/hooks/client/api-error';
import { renderScreen } from '@/tests/components/support/render-screen';

const refused = new ApiError({
  code: 'not-found',
  message: 'There is nothing here.',
  action: 'Go back to the list.',
  problems: [],
});

describe('a screen without its data', () => {
  it('has its title and its main landmark while the data is on its way', () => {
    renderScreen(<UnreadyScreen title="Scores" loading="Loading scores" error={null} onRetry={() => undefined} />);
    expect(screen.getByRole('main').contains(screen.getByRole('heading', { level: 1, name: 'Scores' }))).toBe(true);
    expect(screen.getByText('Loading scores')).toBeTruthy();
  });

  it('has them too when the data did not come, with the reason and a retry', () => {
    const onRetry = jest.fn();
    renderScreen(<UnreadyScreen title="Scores" loading="Loading scores" error={refused} onRetry={onRetry} />);
    const main = screen.getByRole('main');
    expect(main.contains(screen.getByRole('heading', { level: 1, name: 'Scores' }))).toBe(true);
    expect(main.textContent).toContain('There is nothing here. Go back to the list.');
    fireEvent.click(screen.getByRole('button', { name: 'Try again' }));
    expect(onRetry).toHaveBeenCalledTimes(1);
  });
});
