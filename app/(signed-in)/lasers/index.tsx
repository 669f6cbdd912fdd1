import { LasersScreen } from '@/components/lasers/lasers-screen';

export default function LasersRoute() {
  return <LasersScreen />;
}
