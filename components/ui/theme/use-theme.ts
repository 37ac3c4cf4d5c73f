import { useColorScheme } from 'react-native';
import { darkColours, lightColours, type Colours } from '@/components/ui/theme/colours';

/** The colours of the scheme the reader's system asks for. */
export function useColours(): Colours {
  return useColorScheme() === 'dark' ? darkColours : lightColours;
}
