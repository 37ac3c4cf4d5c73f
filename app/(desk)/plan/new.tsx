import { NewPlanScreen } from '@/components/planner/new-plan-screen';

export default function NewPlanRoute() {
  return <NewPlanScreen />;
}
