import { useLocalSearchParams } from 'expo-router';
import { OutlineScreen } from '@/components/outline/outline-screen';

export default function OutlineRoute() {
  const { footingId } = useLocalSearchParams<{ footingId: string }>();
  return <OutlineScreen footingId={footingId} />;
}
