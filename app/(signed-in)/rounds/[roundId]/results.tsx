import { useLocalSearchParams } from 'expo-router';
import { ResultsScreen } from '@/components/results/results-screen';

export default function ResultsRoute() {
  const { roundId } = useLocalSearchParams<{ roundId: string }>();
  return <ResultsScreen roundId={roundId} />;
}
