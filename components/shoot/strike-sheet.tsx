import { useTranslation } from 'react-i18next';
import { Button } from '@/components/ui/button';
import { STRIKE_REASONS, type StrikeRecord } from '@/shared/records';
import { Sheet } from './sheet';

interface StrikeSheetProps {
  place: string;
  reading: string;
  onStrike: (reason: StrikeRecord['reason']) => void;
  onClose: () => void;
}

/** Why a shot is struck out: one press answers. */
export function StrikeSheet({ place, reading, onStrike, onClose }: StrikeSheetProps) {
  const { t } = useTranslation('shoot');
  return (
    <Sheet
      title={t('strike.title', { place, reading })}
      onClose={onClose}
      actions={
        <>
          {STRIKE_REASONS.map((reason) => (
            <Button key={reason} label={t(`strike.${reason}`)} size="large" variant="plain" onPress={() => onStrike(reason)} />
          ))}
          <Button label={t('strike.keep')} size="large" onPress={onClose} />
        </>
      }
    >
      {t('strike.how')}
    </Sheet>
  );
}
