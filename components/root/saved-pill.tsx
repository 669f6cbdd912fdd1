import { StatusPill } from '@/components/ui/status-pill';
import { savedState } from '@/hooks/outbox/saved-state';
import { useOutbox } from '@/hooks/outbox/use-outbox';

/** Where everything recorded on this phone now is. */
export function SavedPill() {
  const { state, count } = savedState(useOutbox());
  return <StatusPill state={state} count={count} />;
}
