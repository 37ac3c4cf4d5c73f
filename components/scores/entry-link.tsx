import { Link } from 'expo-router';
import { textSizes } from '@/components/ui/theme/metrics';
import { sansFace } from '@/components/ui/theme/type-face';
import { useColours } from '@/components/ui/theme/use-theme';

/** Words in a table that lead to an entry. */
export function EntryLink({ entryId, text }: { entryId: string; text: string }) {
  const colours = useColours();
  return (
    <Link
      href={{ pathname: '/journal/[entryId]', params: { entryId } }}
      style={{
        ...sansFace('regular'),
        fontSize: textSizes.row.fontSize,
        color: colours.bramble,
        textDecorationLine: 'underline',
      }}
    >
      {text}
    </Link>
  );
}
