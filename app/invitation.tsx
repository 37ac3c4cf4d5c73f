import { InvitationScreen } from '@/components/account/invitation-screen';

export default function InvitationRoute() {
  return <InvitationScreen />;
}
