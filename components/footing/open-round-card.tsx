import { useTranslation } from 'react-i18next';
import { FieldPair } from '@/components/forms/field-pair';
import { Button } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { Body } from '@/components/ui/text';
import type { Surface } from '@/shared/rules';

interface OpenRoundCardProps {
  surfaces: readonly Surface[];
  busy: boolean;
  onOpen: (surface: Surface) => void;
}

/** A new round of any surface that this person may shoot, beside the one that comes next. */
export function OpenRoundCard({ surfaces, busy, onOpen }: OpenRoundCardProps) {
  const { t } = useTranslation('footing');
  return (
    <Card title={t('open.title')}>
      <Body size="small" tone="ink2">
        {t('open.how')}
      </Body>
      <FieldPair>
        {surfaces.map((surface) => (
          <Button
            key={surface}
            variant="plain"
            label={t(`surface.${surface}`)}
            spokenLabel={t(`next.open.${surface}`)}
            busy={busy}
            onPress={() => onOpen(surface)}
          />
        ))}
      </FieldPair>
    </Card>
  );
}
