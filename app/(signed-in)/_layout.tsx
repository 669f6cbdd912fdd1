import { Slot } from 'expo-router';
import { SignedInOnly } from '@/components/root/signed-in-only';

export { FaultScreen as ErrorBoundary } from '@/components/root/fault-screen';

export default function SignedInLayout() {
  return (
    <SignedInOnly>
      <Slot />
    </SignedInOnly>
  );
}
