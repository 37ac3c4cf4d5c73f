import { type Href } from 'expo-router';
import { type IconName } from '@/components/ui/icon-shapes';

interface Place {
  readonly key: PlaceKey;
  readonly label: string;
  readonly icon: IconName;
  readonly href: Href;
  /** First parts of the addresses that belong to it. */
  readonly roots: readonly string[];
}

export type PlaceKey = 'today' | 'journal' | 'prices' | 'scores' | 'desk';

/** The five places of the product, in their order. */
export const places: readonly Place[] = [
  { key: 'today', label: 'Today', icon: 'today', href: '/', roots: [''] },
  { key: 'journal', label: 'Journal', icon: 'journal', href: '/journal', roots: ['journal', 'plan', 'fills'] },
  { key: 'prices', label: 'Prices', icon: 'prices', href: '/prices', roots: ['prices'] },
  { key: 'scores', label: 'Scores', icon: 'scores', href: '/scores', roots: ['scores', 'review'] },
  { key: 'desk', label: 'Desk', icon: 'desk', href: '/desk', roots: ['desk'] },
];

/** The place an address belongs to, if any. */
export function placeOf(pathname: string): PlaceKey | null {
  const root = pathname.split('/')[1] ?? '';
  return places.find(({ roots }) => roots.includes(root))?.key ?? null;
}
