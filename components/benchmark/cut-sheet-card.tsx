import { useState } from 'react';
import { useTranslation } from 'react-i18next';
import { StyleSheet, View } from 'react-native';
import type { LengthStyle } from '@/analysis';
import { describeError } from '@/components/forms/describe-error';
import { LengthField } from '@/components/lengths/length-field';
import { printLength } from '@/components/lengths/print-length';
import { Button } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { Choice } from '@/components/ui/choice';
import { Notice } from '@/components/ui/notice';
import { Body, Figure } from '@/components/ui/text';
import { space } from '@/constants/theme';
import { useChangeFooting } from '@/hooks/api/footing-queries';
import { useMay } from '@/hooks/session/use-session';
import type { FootingSummary } from '@/shared/api/footing-schemas';
import { readCutSheet, type CutOrFill } from './cut-sheet';

interface CutSheetCardProps {
  /** The hub's elevation as typed in the form above. */
  elevation: string;
  style: LengthStyle;
  footings: readonly FootingSummary[];
}

/** A hub and its cut give a grade: computed, shown, and put in as a footing's plan grade with one press. */
export function CutSheetCard({ elevation, style, footings }: CutSheetCardProps) {
  const { t } = useTranslation('setup');
  const [direction, setDirection] = useState<CutOrFill>('cut');
  const [amount, setAmount] = useState('');
  const changing = useChangeFooting();
  const mayChange = useMay('footing.write');
  const sheet = readCutSheet({ elevation, amount, direction }, style);
  const grade = sheet === null ? '' : printLength(sheet.grade, style);
  const used = footings.find(({ id }) => id === changing.data?.id);
  return (
    <Card title={t('benchmark.cutSheet')}>
      <Body size="small" tone="ink2">
        {t('benchmark.cutSheetHow')}
      </Body>
      <View style={styles.row}>
        <Choice
          label={t('benchmark.direction')}
          style={styles.half}
          value={direction}
          onChange={setDirection}
          options={[
            { value: 'cut', label: t('benchmark.cut') },
            { value: 'fill', label: t('benchmark.fill') },
          ]}
        />
        <LengthField
          label={t('benchmark.amount')}
          hint={t('benchmark.amountHint')}
          boxStyle={styles.half}
          value={amount}
          onChange={setAmount}
          style={style}
          sign="not-negative"
          bareDecimal="feet"
        />
      </View>
      <View role="status" style={styles.gives}>
        {sheet === null ? null : (
          <>
            <Figure size="head" weight="bold">
              {t('benchmark.gives', { grade })}
            </Figure>
            <Figure tone="ink2">
              {t(direction === 'cut' ? 'benchmark.workingCut' : 'benchmark.workingFill', {
                elevation: printLength(sheet.hub, style),
                amount: printLength(sheet.amount, style),
                grade,
              })}
            </Figure>
          </>
        )}
        {used && changing.data ? (
          <Notice kind="good">
            {t('benchmark.used', { footing: used.name, grade: printLength(changing.data.planGrade, style) })}
          </Notice>
        ) : null}
      </View>
      {changing.error ? <Notice kind="refusal">{describeError(changing.error)}</Notice> : null}
      {sheet !== null && mayChange
        ? footings.map((footing) => (
            <Button
              key={footing.id}
              label={t('benchmark.use', { footing: footing.name })}
              variant="plain"
              size="small"
              busy={changing.isPending}
              onPress={() => changing.mutate({ footingId: footing.id, change: { planGrade: sheet.grade } })}
            />
          ))
        : null}
    </Card>
  );
}

const styles = StyleSheet.create({
  row: { flexDirection: 'row', flexWrap: 'wrap', gap: space.m },
  half: { flexGrow: 1, flexShrink: 1, flexBasis: 180, minWidth: 0 },
  gives: { gap: space.xs },
});
