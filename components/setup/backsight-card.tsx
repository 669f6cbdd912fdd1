import { useState } from 'react';
import { useTranslation } from 'react-i18next';
import { StyleSheet, View } from 'react-native';
import { printLength, printSmall } from '@/components/lengths/print-length';
import { Button } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { Notice } from '@/components/ui/notice';
import { Body, Figure } from '@/components/ui/text';
import { TextField } from '@/components/ui/text-field';
import { space, target } from '@/constants/theme';
import { useTokens } from '@/hooks/use-tokens';
import type { RoundBundle } from '@/shared/api/round-endpoints';
import type { RoundSeries } from '@/shared/round/round-state';
import { BacksightKeys } from './backsight-keys';
import type { Setup } from './use-setup';

/** Reading the rod on the benchmark, once or as often as one likes: typed, or with keys for a glove. */
export function BacksightCard({ setup, bundle }: { setup: Setup; bundle: RoundBundle }) {
  const { t } = useTranslation('setup');
  const [keys, setKeys] = useState(false);
  const { series, rules } = setup;
  const benchmark = bundle.benchmarks.find(({ id }) => id === setup.picked.benchmarkId)?.name ?? t('instruments.benchmark');
  const again = series !== null && series.hi !== null;
  const style = rules?.style ?? bundle.job.unitStyle;
  const keying = keys && rules !== null;
  const change = () => {
    if (keying) setup.keepAsText();
    setKeys(!keying);
  };
  return (
    <>
      <Card title={t('backsight.title', { benchmark })} weight="heavy">
        {series ? <Backsights setup={setup} series={series} bundle={bundle} /> : null}
        {keying ? null : (
          <TextField
            label={t(again ? 'backsight.again' : 'backsight.label', { benchmark })}
            hint={again ? t('backsight.againHint') : t(`backsight.hint.${style}`)}
            value={setup.entry.typed ?? ''}
            onChangeText={(text) => setup.key({ kind: 'type', text })}
            onSubmitEditing={setup.record}
            error={setup.refusalAt('reading')}
            autoCapitalize="none"
            autoComplete="off"
            maxLength={40}
            figures
          />
        )}
        {setup.refusalAt('keeping') ? <Notice kind="refusal">{setup.refusalAt('keeping')}</Notice> : null}
        <View style={styles.buttons}>
          {again ? (
            <Button label={t('backsight.recordAgain')} variant="plain" busy={setup.keeping} onPress={setup.record} />
          ) : null}
          {rules ? <Button label={t(keying ? 'backsight.typing' : 'backsight.keys')} variant="quiet" onPress={change} /> : null}
          {again ? <Button label={t('backsight.anew')} variant="quiet" onPress={setup.anew} /> : null}
        </View>
      </Card>
      {keying ? <BacksightKeys setup={setup} rules={rules} /> : null}
    </>
  );
}

/** What was read so far, struck ones with their line, and by how much the others differ. */
function Backsights({ setup, series, bundle }: { setup: Setup; series: RoundSeries; bundle: RoundBundle }) {
  const { t } = useTranslation('setup');
  const tokens = useTokens();
  const style = setup.rules?.style ?? bundle.job.unitStyle;
  const readings = series.readings.filter(({ record }) => record.purpose === 'backsight');
  const live = readings.filter(({ struck }) => !struck);
  const wide = series.backsightSpread > setup.checkLimit;
  const spread = printSmall(series.backsightSpread, style);
  return (
    <>
      <View role="list">
        {readings.map(({ record, struck }, index) => {
          const reading = printLength(record.reading, record.style);
          return (
            <View key={record.id} role="listitem" style={[styles.reading, { borderBottomColor: tokens.rule }]}>
              <Body>{t('backsight.number', { number: index + 1 })}</Body>
              <Figure size="head" weight="bold" struck={struck}>
                {reading}
              </Figure>
              {struck ? (
                <Body size="small" tone="ink2">
                  {t('backsight.struck')}
                </Body>
              ) : live.length > 1 ? (
                <Button
                  label={t('backsight.strike')}
                  spokenLabel={t('backsight.strikeSpoken', { number: index + 1, reading })}
                  variant="quiet"
                  size="small"
                  onPress={() => setup.strike(record.id)}
                />
              ) : null}
            </View>
          );
        })}
      </View>
      <View role="status">
        {live.length < 2 ? null : wide ? (
          <Notice kind="caution" lead={t('backsight.spreadWide', { spread, limit: printSmall(setup.checkLimit, style) })}>
            {t('backsight.spreadWideHow')}
          </Notice>
        ) : (
          <Body size="small">{t('backsight.spread', { spread })}</Body>
        )}
      </View>
    </>
  );
}

const styles = StyleSheet.create({
  buttons: { flexDirection: 'row', flexWrap: 'wrap', gap: space.s },
  reading: {
    flexDirection: 'row',
    flexWrap: 'wrap',
    alignItems: 'center',
    justifyContent: 'space-between',
    columnGap: space.m,
    minHeight: target.least,
    borderBottomWidth: 1,
  },
});
