import { NewRodScreen } from '@/components/lasers/new-rod-screen';

export default function NewRodRoute() {
  return <NewRodScreen />;
}
