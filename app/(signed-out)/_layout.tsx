import { Slot } from 'expo-router';
import { SignedOutOnly } from '@/components/root/signed-out-only';

export default function SignedOutLayout() {
  return (
    <SignedOutOnly>
      <Slot />
    </SignedOutOnly>
  );
}
