import { fireEvent, render, screen } from '@testing-library/react';
import { Button } from '@/components/ui/button';

describe('Button', () => {
  it('takes no second press while it is busy, and says what it does', () => {
    const onPress = jest.fn();
    render(<Button label="Seal forecast" busy busyLabel="Sealing …" onPress={onPress} />);
    const button = screen.getByRole('button', { name: 'Sealing …' });
    fireEvent.click(button);
    expect(onPress).not.toHaveBeenCalled();
    expect(button.getAttribute('aria-busy')).toBe('true');
  });

  it('has its label as name when only the icon is shown', () => {
    render(<Button label="Take out the fill" icon="trash" kind="text" iconOnly />);
    expect(screen.getByRole('button', { name: 'Take out the fill' }).textContent).toBe('');
  });

  it('is described by its hint', () => {
    render(<Button label="Uncover the outcome" disabled accessibilityHint="Point 3 has no mark yet." />);
    const id = screen.getByRole('button').getAttribute('aria-describedby');
    expect(document.getElementById(id ?? '')?.textContent).toBe('Point 3 has no mark yet.');
  });
});
