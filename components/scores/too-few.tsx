import { Txt } from '@/components/ui/text';

/** Stands where figures would, while there are too few for any. */
export function TooFew({ count, what }: { count: number; what: string }) {
  return (
    <Txt size="row" colour="inkSoft">
      {`${count} ${what}: too few for a rate. Figures are shown from 20 on.`}
    </Txt>
  );
}
