import { Button } from '@/components/ui/button';

/** Prints the page as it stands, without what leads elsewhere. */
export function PrintButton() {
  return <Button kind="text" icon="print" label="Print" onPress={() => window.print()} />;
}
