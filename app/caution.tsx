import { CautionScreen } from '@/components/caution/caution-screen';

export default function CautionRoute() {
  return <CautionScreen />;
}
