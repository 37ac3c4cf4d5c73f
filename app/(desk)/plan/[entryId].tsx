import { useLocalSearchParams } from 'expo-router';
import { PlannerScreen } from '@/components/planner/planner-screen';

export default function PlanRoute() {
  const { entryId } = useLocalSearchParams<'/plan/[entryId]'>();
  return <PlannerScreen entryId={entryId} />;
}
