import { NotFoundScreen } from '@/components/frame/not-found-screen';

export default function NotFoundRoute() {
  return <NotFoundScreen />;
}
