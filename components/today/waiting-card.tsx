import { useTranslation } from 'react-i18next';
import { Button } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { Body, Heading, Label } from '@/components/ui/text';
import type { Waiting } from '@/shared/api/job-endpoints';
import { waitingWords } from './waiting-words';

/** The one thing that is most pressing, with the one button of the screen. */
export function WaitingCard({ waiting }: { waiting: Waiting }) {
  const { t } = useTranslation('today');
  const { title, note, button, href } = waitingWords(waiting);
  return (
    <Card weight="heavy">
      <Label weight="semibold">{t('forYou')}</Label>
      <Heading level={2} size="head">
        {title}
      </Heading>
      <Body tone="ink2">{note}</Body>
      <Button variant="primary" size="large" label={button} href={href} />
    </Card>
  );
}
