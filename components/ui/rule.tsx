import { View } from 'react-native';
import { useColours } from '@/components/ui/theme/use-theme';

/** A hairline between things. */
export function Rule() {
  return <View style={{ height: 1, backgroundColor: useColours().rule }} />;
}
