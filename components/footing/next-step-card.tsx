import { useTranslation } from 'react-i18next';
import { Body, Heading, Label } from '@/components/ui/text';
import { Card } from '@/components/ui/card';
import type { NextStep } from './next-step';
import { roundName, roundWords } from './round-words';

/** What comes next and why, over the button at the thumb. */
export function NextStepCard({ step }: { step: NextStep }) {
  const { t } = useTranslation('footing');
  const words = () => {
    switch (step.do) {
      case 'go-on':
        return { title: t('next.go-on', { round: roundName(step.round) }), note: roundWords(step.round) };
      case 'see-results':
        return { title: t('next.see-results', { round: roundName(step.round) }), note: roundWords(step.round) };
      case 'open-round':
        return { title: t(`next.open.${step.surface}`), note: t(`next.openNote.${step.surface}`) };
      case 'wait':
        return { title: t(`next.wait.${step.for}`), note: t(`next.waitNote.${step.for}`) };
      default:
        return { title: t(`next.${step.do}`), note: t(`next.${step.do}Note`) };
    }
  };
  const { title, note } = words();
  return (
    <Card weight="heavy">
      <Label weight="semibold">{t('next.label')}</Label>
      <Heading level={2} size="head">
        {title}
      </Heading>
      <Body tone="ink2">{note}</Body>
    </Card>
  );
}
