import { FontDisplay, useFonts } from 'expo-font';
import sansRegular from '@/assets/fonts/brierbook-sans-400.woff2';
import sansMedium from '@/assets/fonts/brierbook-sans-500.woff2';
import sansSemiBold from '@/assets/fonts/brierbook-sans-600.woff2';
import serif from '@/assets/fonts/young-serif-400.woff2';
import { fontFamilies } from '@/components/ui/theme/metrics';

const faces = {
  [fontFamilies.serif]: { uri: serif, display: FontDisplay.SWAP },
  [fontFamilies.sans]: { uri: sansRegular, display: FontDisplay.SWAP },
  [fontFamilies.sansMedium]: { uri: sansMedium, display: FontDisplay.SWAP },
  [fontFamilies.sansSemiBold]: { uri: sansSemiBold, display: FontDisplay.SWAP },
};

/** Asks for the fonts. Text shows in the reader's own fonts until they are here, so nothing waits for this. */
export function useBrierbookFonts(): void {
  useFonts(faces);
}
