import { SignUpScreen } from '@/components/account/sign-up-screen';

export default function SignUpRoute() {
  return <SignUpScreen />;
}
