import { JobsScreen } from '@/components/jobs/jobs-screen';

export default function JobsRoute() {
  return <JobsScreen />;
}
