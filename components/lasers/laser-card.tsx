import { useState } from 'react';
import { useTranslation } from 'react-i18next';
import { describeError } from '@/components/forms/describe-error';
import { accuracyWords } from '@/components/lengths/length-words';
import { printSmall } from '@/components/lengths/print-length';
import { dayWords } from '@/components/time/day-words';
import { Button } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { ListRow } from '@/components/ui/list-row';
import { Notice } from '@/components/ui/notice';
import { useChangeLaser } from '@/hooks/api/instrument-queries';
import { useMay } from '@/hooks/session/use-session';
import type { Laser } from '@/shared/api/instrument-endpoints';
import { laserCheckDue, localDay } from '@/shared/laser-check-age';
import { laserStyle } from './laser-style';

/** A laser: what its maker states, what its receiver can tell, and when it was last checked. */
export function LaserCard({ laser }: { laser: Laser }) {
  const { t } = useTranslation('lasers');
  const mayChange = useMay('laser.write');
  const change = useChangeLaser();
  const style = laserStyle(laser);
  const [today] = useState(() => localDay(Date.now()));
  return (
    <Card title={laser.name}>
      <ListRow title={t('laser.accuracy')} end={accuracyWords(laser, style)} />
      <ListRow title={t('laser.fine')} end={printSmall(laser.receiverFine, style)} />
      <ListRow title={t('laser.coarse')} end={printSmall(laser.receiverCoarse, style)} />
      <ListRow title={t('laser.checked')} end={laser.checkedOn === null ? t('laser.never') : dayWords(laser.checkedOn)} last />
      <CheckWarning laser={laser} today={today} />
      {change.error === null ? null : <Notice kind="refusal">{describeError(change.error)}</Notice>}
      {mayChange && laser.checkedOn !== today ? (
        <Button
          variant="plain"
          label={t('laser.checkedToday')}
          spokenLabel={t('laser.checkedTodayOf', { laser: laser.name })}
          busy={change.isPending}
          onPress={() => change.mutate({ laserId: laser.id, change: { checkedOn: today } })}
        />
      ) : null}
    </Card>
  );
}

/** Says that a laser was never checked, or too long ago to rely on. Nothing is stopped by it. */
function CheckWarning({ laser, today }: { laser: Laser; today: string }) {
  const { t } = useTranslation('lasers');
  const due = laserCheckDue(laser.checkedOn, today);
  if (due === null) return null;
  return (
    <Notice kind="caution" lead={due.kind === 'never' ? t('laser.neverLead') : t('laser.oldLead', { count: due.days })}>
      {t('laser.checkHow')}
    </Notice>
  );
}
