import { useLocalSearchParams } from 'expo-router';
import { JobScreen } from '@/components/jobs/job-screen';

export default function JobRoute() {
  const { jobId } = useLocalSearchParams<{ jobId: string }>();
  return <JobScreen jobId={jobId} />;
}
