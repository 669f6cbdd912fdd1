import { useTranslation } from 'react-i18next';
import { Button } from '@/components/ui/button';
import { EmptyState } from '@/components/ui/empty-state';
import { Notice } from '@/components/ui/notice';
import { useSession } from '@/hooks/session/use-session';
import { othersSeries } from './choose-series';
import type { Shooting } from './use-shooting';

/** No backsight stands: nothing is recorded without one, and this is the way to it. */
export function NeedsSetup({ shooting }: { shooting: Shooting }) {
  const { t } = useTranslation('shoot');
  const personId = useSession().me?.person.id ?? '';
  const { view, series } = shooting;
  const other = series === null ? othersSeries(view.state, personId) : null;
  return (
    <>
      <EmptyState
        title={t('needsSetup.title')}
        action={
          <Button
            label={t('needsSetup.button')}
            variant="primary"
            size="large"
            href={{ pathname: '/rounds/[roundId]/setup', params: { roundId: view.bundle.round.id } }}
          />
        }
      >
        {t(series === null ? 'needsSetup.noSetup' : 'needsSetup.noBacksight')}
      </EmptyState>
      {other ? (
        <Notice
          kind="plain"
          actions={
            <Button
              label={t('needsSetup.takeOver', { name: other.person.name })}
              size="large"
              onPress={() => shooting.takeSeries(other.id)}
            />
          }
        >
          {t('needsSetup.takeOverHow')}
        </Notice>
      ) : null}
    </>
  );
}
