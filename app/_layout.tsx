import '@/assets/page.css';
import '@/hooks/i18n/i18n';
import { Slot } from 'expo-router';
import { Root } from '@/components/root/root';

export { FaultScreen as ErrorBoundary } from '@/components/root/fault-screen';

export default function RootLayout() {
  return (
    <Root>
      <Slot />
    </Root>
  );
}
