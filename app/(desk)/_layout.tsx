import { Slot } from 'expo-router';
import { SignedIn } from '@/components/frame/signed-in';

export default function DeskLayout() {
  return (
    <SignedIn>
      <Slot />
    </SignedIn>
  );
}
