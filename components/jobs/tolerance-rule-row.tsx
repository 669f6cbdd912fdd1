import { useState } from 'react';
import { useTranslation } from 'react-i18next';
import { StyleSheet, View } from 'react-native';
import { space } from '@/constants/theme';
import { toleranceWords } from '@/components/lengths/length-words';
import { Button } from '@/components/ui/button';
import { ListRow } from '@/components/ui/list-row';
import { Figure } from '@/components/ui/text';
import { useSetToleranceRule } from '@/hooks/api/job-queries';
import { useMay } from '@/hooks/session/use-session';
import type { Job } from '@/shared/api/job-endpoints';
import { readyToleranceRules, type Surface, type ToleranceRule } from '@/shared/rules';
import { readTolerance, toleranceDraft, toleranceDrafts, type RulesForm } from './rule-drafts';
import { RuleEditor } from './rule-editor';
import { ToleranceFields } from './tolerance-fields';
import { versionWords } from './version-words';

interface RowProps {
  job: Job;
  surface: Surface;
  last: boolean;
}

/** The tolerance of one surface with its version; whoever owns the company may change it. */
export function ToleranceRuleRow({ job, surface, last }: RowProps) {
  const { t } = useTranslation(['jobs', 'footing', 'common']);
  const mayChange = useMay('rules.change');
  const [open, setOpen] = useState(false);
  const rule = job.toleranceRules.find((one) => one.surface === surface);
  if (!rule) return null;
  const name = t(`footing:surface.${surface}`);
  const note = [versionWords(rule), rule.decision === 'guarded' ? t('jobs:rule.guardedShort') : null];
  return (
    <View style={styles.rule}>
      <ListRow
        title={name}
        note={note.filter((part) => part !== null).join(' · ')}
        end={
          <View style={styles.end}>
            <Figure>{toleranceWords(rule)}</Figure>
            {mayChange && !open ? (
              <Button
                variant="quiet"
                size="small"
                label={t('common:action.edit')}
                spokenLabel={t('jobs:rule.changeOf', { surface: name })}
                onPress={() => setOpen(true)}
              />
            ) : null}
          </View>
        }
        last={last || open}
      />
      {open ? <ToleranceEditor job={job} rule={rule} onClose={() => setOpen(false)} /> : null}
    </View>
  );
}

function ToleranceEditor({ job, rule, onClose }: { job: Job; rule: ToleranceRule; onClose: () => void }) {
  const setRule = useSetToleranceRule(job.id);
  const { surface } = rule;
  // The form of all four surfaces with one of them shown: the fields are the same as in a new job.
  const defaultValues = {
    rules: { ...toleranceDrafts(readyToleranceRules(job.unitStyle)), [surface]: toleranceDraft(rule) },
  };
  return (
    <RuleEditor<RulesForm>
      defaultValues={defaultValues}
      save={({ rules }) => setRule.mutateAsync({ surface, rule: readTolerance(rules[surface], job.unitStyle) })}
      onClose={onClose}
    >
      <ToleranceFields surface={surface} style={job.unitStyle} />
    </RuleEditor>
  );
}

const styles = StyleSheet.create({
  rule: { gap: space.s },
  end: {
    flexDirection: 'row',
    flexWrap: 'wrap',
    alignItems: 'center',
    justifyContent: 'flex-end',
    columnGap: space.m,
    flexShrink: 1,
  },
});
