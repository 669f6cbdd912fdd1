import '@/assets/page.css';
import '@/hooks/i18n/i18n';
import { useFonts } from 'expo-font';
import { Slot } from 'expo-router';
import { fontFiles } from '@/constants/fonts';

export default function RootLayout() {
  const [loaded, failed] = useFonts(fontFiles);
  // A font that cannot be fetched costs its looks, not the screen.
  return loaded || failed ? <Slot /> : null;
}
