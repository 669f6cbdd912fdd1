import { useState } from 'react';
import { useTranslation } from 'react-i18next';
import { printSmall } from '@/components/lengths/print-length';
import { Button } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { ListRow } from '@/components/ui/list-row';
import { Body } from '@/components/ui/text';
import { useSetBedRule } from '@/hooks/api/job-queries';
import { useMay } from '@/hooks/session/use-session';
import type { Job } from '@/shared/api/job-endpoints';
import type { BedRule } from '@/shared/rules';
import { BedFields } from './bed-fields';
import { bedDraft, readBed, type BedForm } from './rule-drafts';
import { RuleEditor } from './rule-editor';
import { versionWords } from './version-words';

/** What the first course of a job may lie on, with its version; whoever owns the company may change it. */
export function BedRuleCard({ job }: { job: Job }) {
  const { t } = useTranslation(['jobs', 'common']);
  const mayChange = useMay('rules.change');
  const setRule = useSetBedRule(job.id);
  const [open, setOpen] = useState(false);
  const rule = job.bedRule;
  return (
    <Card title={t('jobs:bed.title')}>
      {open ? null : <BedLines rule={rule} />}
      {mayChange && !open ? (
        <Button
          variant="quiet"
          size="small"
          label={t('common:action.edit')}
          spokenLabel={t('jobs:bed.change')}
          onPress={() => setOpen(true)}
          style={{ alignSelf: 'flex-start' }}
        />
      ) : null}
      {open ? (
        <RuleEditor<BedForm>
          defaultValues={{ bed: bedDraft(rule) }}
          save={({ bed }) => setRule.mutateAsync(readBed(bed, job.unitStyle))}
          onClose={() => setOpen(false)}
        >
          <BedFields style={job.unitStyle} />
        </RuleEditor>
      ) : null}
    </Card>
  );
}

function BedLines({ rule }: { rule: BedRule }) {
  const { t } = useTranslation('jobs');
  const print = (length: number) => printSmall(length, rule.style);
  return (
    <>
      <ListRow title={t('bed.material')} end={t(`bed.${rule.material}`)} />
      <ListRow title={t('bed.thickness')} end={t('bed.range', { least: print(rule.least), most: print(rule.most) })} />
      <ListRow title={t('bed.nominal')} end={print(rule.nominal)} />
      <ListRow title={t('bed.grindMost')} end={print(rule.grindMost)} />
      <ListRow title={t('bed.fraction')} end={t('bed.share', { percent: Math.round(rule.beddedFraction * 100) })} />
      <ListRow
        title={t('bed.courseHeight')}
        end={rule.courseHeight === null ? t('bed.anyHeight') : print(rule.courseHeight)}
        last
      />
      <Body size="small" tone="ink2">
        {versionWords(rule)}
      </Body>
    </>
  );
}
