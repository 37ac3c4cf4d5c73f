import { useLocalSearchParams, useRouter } from 'expo-router';
import { ScoresScreen } from '@/components/scores/scores-screen';
import { type ScoreFilter, scoreFilterSchema } from '@/shared/scores/score-filter';

/** Cleared when the next address is written, since addresses merge. */
const nothing: Record<keyof ScoreFilter, undefined> = {
  traderId: undefined,
  underlyingId: undefined,
  structureKind: undefined,
  horizonClass: undefined,
  tag: undefined,
  from: undefined,
  to: undefined,
  traded: undefined,
  evenIfFew: undefined,
};

/** The filter stands in the address, so that a narrowed page can be kept and sent on. */
export default function ScoresRoute() {
  const router = useRouter();
  const read = scoreFilterSchema.safeParse({ ...useLocalSearchParams() });
  return (
    <ScoresScreen
      filter={read.success ? read.data : {}}
      onFilter={(filter) => router.setParams({ ...nothing, ...filter })}
    />
  );
}
