import { useState } from 'react';
import { useFormContext, useWatch } from 'react-hook-form';
import { useTranslation } from 'react-i18next';
import { StyleSheet, View } from 'react-native';
import { AnalysisError } from '@/analysis';
import { space } from '@/constants/theme';
import { toleranceWords } from '@/components/lengths/length-words';
import { Button } from '@/components/ui/button';
import { Body, Figure } from '@/components/ui/text';
import type { UnitStyle } from '@/shared/quantities';
import type { Surface } from '@/shared/rules';
import { readTolerance, type RulesForm, type ToleranceDraft } from './rule-drafts';
import { ToleranceFields } from './tolerance-fields';

function draftWords(draft: ToleranceDraft, style: UnitStyle): string | null {
  try {
    return toleranceWords(readTolerance(draft, style));
  } catch (error) {
    if (error instanceof AnalysisError) return null;
    throw error;
  }
}

/** One surface's tolerance in a form: its words, and its fields when somebody wants another. One that does not read stays open. */
export function SurfaceRule({ surface, style }: { surface: Surface; style: UnitStyle }) {
  const { t } = useTranslation(['jobs', 'footing', 'common']);
  const { control } = useFormContext<RulesForm>();
  const draft = useWatch({ control, name: `rules.${surface}` });
  const [open, setOpen] = useState(false);
  const words = draftWords(draft, style);
  const name = t(`footing:surface.${surface}`);
  return (
    <View style={styles.rule}>
      <View style={styles.head}>
        <Body weight="semibold" style={styles.name}>
          {name}
        </Body>
        {words === null ? null : <Figure>{words}</Figure>}
        <Button
          variant="quiet"
          size="small"
          label={open ? t('common:action.close') : t('common:action.edit')}
          spokenLabel={open ? t('jobs:rule.closeOf', { surface: name }) : t('jobs:rule.changeOf', { surface: name })}
          onPress={() => setOpen(!open)}
        />
      </View>
      {open || words === null ? <ToleranceFields surface={surface} style={style} /> : null}
    </View>
  );
}

const styles = StyleSheet.create({
  rule: { gap: space.s },
  head: { flexDirection: 'row', alignItems: 'center', flexWrap: 'wrap', gap: space.m },
  name: { flexGrow: 1 },
});
