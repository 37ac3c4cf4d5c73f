import { useWindowDimensions } from 'react-native';
import { breakpoints } from '@/components/ui/theme/metrics';

export type LayoutKind = 'phone' | 'medium' | 'wide';

/** How much room the window gives: one column on a phone, two panes and a rail when wide. */
export function useLayout(): { readonly kind: LayoutKind; readonly width: number } {
  const { width } = useWindowDimensions();
  return { kind: width >= breakpoints.wide ? 'wide' : width >= breakpoints.medium ? 'medium' : 'phone', width };
}
