import { useTranslation } from 'react-i18next';
import { cornerLetter, traceOutline } from '@/analysis';
import { PlanView } from '@/components/charts/plan-view';
import { Button } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { FieldPair } from '@/components/forms/field-pair';
import { Body } from '@/components/ui/text';
import { useMay } from '@/hooks/session/use-session';
import type { Footing } from '@/shared/api/footing-schemas';

/** The footing from above with its stations, and the ways to change both. */
export function FootingPlanCard({ footing }: { footing: Footing }) {
  const { t } = useTranslation('footing');
  const mayDraw = useMay(footing.hasShots ? 'outline.change-after-shots' : 'outline.change');
  const mayStation = useMay('station.write');
  const params = { footingId: footing.id };
  const drawn = footing.runs.length > 0;
  return (
    <Card title={t('plan.title')} note={drawn ? t('plan.stations', { count: footing.stations.length }) : undefined}>
      {drawn ? <Plan footing={footing} /> : <Body tone="ink2">{t('plan.none')}</Body>}
      <FieldPair>
        {drawn ? (
          <Button
            label={mayDraw ? t('plan.outline') : t('plan.seeOutline')}
            variant="plain"
            href={{ pathname: '/footings/[footingId]/outline', params }}
          />
        ) : null}
        {drawn && (mayStation || footing.stations.length > 0) ? (
          <Button
            label={mayStation ? t('plan.setStations') : t('plan.seeStations')}
            variant="plain"
            href={{ pathname: '/footings/[footingId]/stations', params }}
          />
        ) : null}
      </FieldPair>
    </Card>
  );
}

function Plan({ footing }: { footing: Footing }) {
  const { corners, closure } = traceOutline(footing.runs);
  return (
    <PlanView
      corners={corners.map((corner, at) => ({ ...corner, label: cornerLetter(at) }))}
      closed={closure.angle === 0}
      width={footing.width}
      stations={footing.stations.map(({ id, name, x, y }) => ({ id, label: name, x, y, mark: 'not-shot' }))}
    />
  );
}
