import { CrewScreen } from '@/components/crew/crew-screen';

export default function CrewRoute() {
  return <CrewScreen />;
}
