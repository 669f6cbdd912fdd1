import { useTranslation } from 'react-i18next';
import { Button } from '@/components/ui/button';
import { Sheet } from './sheet';

interface JumpSheetProps {
  /** How far off, in words: "3/4″". */
  size: string;
  place: string;
  reading: string;
  onAnswer: (record: boolean) => void;
}

/** A reading far off its neighbours: usually the inch or the foot that was carried over. */
export function JumpSheet({ size, place, reading, onAnswer }: JumpSheetProps) {
  const { t } = useTranslation('shoot');
  return (
    <Sheet
      title={t('jump.title', { size })}
      onClose={() => onAnswer(false)}
      actions={
        <>
          <Button label={t('jump.again')} size="large" variant="primary" onPress={() => onAnswer(false)} />
          <Button label={t('jump.record')} size="large" onPress={() => onAnswer(true)} />
        </>
      }
    >
      {t('jump.how', { place, reading })}
    </Sheet>
  );
}
