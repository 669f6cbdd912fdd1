import { NewLaserScreen } from '@/components/lasers/new-laser-screen';

export default function NewLaserRoute() {
  return <NewLaserScreen />;
}
