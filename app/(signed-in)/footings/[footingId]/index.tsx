import { useLocalSearchParams } from 'expo-router';
import { FootingScreen } from '@/components/footing/footing-screen';

export default function FootingRoute() {
  const { footingId } = useLocalSearchParams<{ footingId: string }>();
  return <FootingScreen footingId={footingId} />;
}
