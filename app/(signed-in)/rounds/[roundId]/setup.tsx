import { useLocalSearchParams } from 'expo-router';
import { SetupScreen } from '@/components/setup/setup-screen';

export default function SetupRoute() {
  const { roundId } = useLocalSearchParams<{ roundId: string }>();
  return <SetupScreen roundId={roundId} />;
}
