import { type Colours } from '@/components/ui/theme/colours';
import { radius, sizes } from '@/components/ui/theme/metrics';

/** The box of an input; a refused one has a thicker border and keeps its inner width. */
export function fieldBox(colours: Colours, hasError: boolean) {
  return {
    minHeight: sizes.field,
    borderWidth: hasError ? 2 : 1,
    borderStyle: 'solid' as const,
    borderColor: hasError ? colours.rust : colours.edge,
    borderRadius: radius.control,
    backgroundColor: colours.sheet,
    color: colours.ink,
    paddingLeft: hasError ? 12 : 13,
    paddingRight: hasError ? 12 : 13,
  };
}
