import { act, render, screen } from '@testing-library/react';
import { darkColours, lightColours } from '@/components/ui/theme/colours';
import { useColours } from '@/components/ui/theme/use-theme';

jest.mock('react-native-web/dist/exports/useColorScheme', () => ({ __esModule: true, default: () => 'dark' }));

function Ground() {
  return <p>{useColours().paper}</p>;
}

describe('the colours of a page', () => {
  it('are light on paper, and dark again after it', () => {
    render(<Ground />);
    expect(screen.getByText(darkColours.paper)).toBeTruthy();
    act(() => void window.dispatchEvent(new Event('beforeprint')));
    expect(screen.getByText(lightColours.paper)).toBeTruthy();
    act(() => void window.dispatchEvent(new Event('afterprint')));
    expect(screen.getByText(darkColours.paper)).toBeTruthy();
  });
});
