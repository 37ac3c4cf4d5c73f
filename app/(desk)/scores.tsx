import { ScoresScreen } from '@/components/scores/scores-screen';

export default function ScoresRoute() {
  return <ScoresScreen />;
}
