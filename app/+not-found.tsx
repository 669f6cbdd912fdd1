import { MissingScreen } from '@/components/root/missing-screen';

export default function NotFoundRoute() {
  return <MissingScreen />;
}
