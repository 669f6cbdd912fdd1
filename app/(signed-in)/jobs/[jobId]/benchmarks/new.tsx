import { useLocalSearchParams } from 'expo-router';
import { NewBenchmarkScreen } from '@/components/benchmark/new-benchmark-screen';

export default function NewBenchmarkRoute() {
  const { jobId, roundId } = useLocalSearchParams<{ jobId: string; roundId?: string }>();
  return <NewBenchmarkScreen jobId={jobId} roundId={roundId} />;
}
