import { useLocalSearchParams } from 'expo-router';
import { WeeklyReviewScreen } from '@/components/review/weekly-review-screen';

export default function WeeklyReviewRoute() {
  const { week, trader } = useLocalSearchParams<'/review', { week?: string; trader?: string }>();
  return <WeeklyReviewScreen week={week} traderId={trader} />;
}
