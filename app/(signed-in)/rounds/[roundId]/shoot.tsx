import { useLocalSearchParams } from 'expo-router';
import { ShootScreen } from '@/components/shoot/shoot-screen';

export default function ShootRoute() {
  const { roundId, station, rail } = useLocalSearchParams<{ roundId: string; station?: string; rail?: string }>();
  return <ShootScreen roundId={roundId} at={station && rail ? `${station}/${rail}` : null} />;
}
