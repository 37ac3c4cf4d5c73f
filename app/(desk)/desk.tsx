import { DeskScreen } from '@/components/desk/desk-screen';

export default function DeskRoute() {
  return <DeskScreen />;
}
