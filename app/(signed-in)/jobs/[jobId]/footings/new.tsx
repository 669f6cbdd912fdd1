import { useLocalSearchParams } from 'expo-router';
import { NewFootingScreen } from '@/components/footing/new-footing-screen';

export default function NewFootingRoute() {
  const { jobId } = useLocalSearchParams<{ jobId: string }>();
  return <NewFootingScreen jobId={jobId} />;
}
