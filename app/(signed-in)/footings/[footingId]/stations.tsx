import { useLocalSearchParams } from 'expo-router';
import { StationsScreen } from '@/components/stations/stations-screen';

export default function StationsRoute() {
  const { footingId } = useLocalSearchParams<{ footingId: string }>();
  return <StationsScreen footingId={footingId} />;
}
