import { useId, useRef } from 'react';
import { useTranslation } from 'react-i18next';
import { StyleSheet, View, type TextInput } from 'react-native';
import type { Nm } from '@/analysis';
import { printSmall } from '@/components/lengths/print-length';
import { Button } from '@/components/ui/button';
import { FieldError } from '@/components/ui/field-error';
import { Notice } from '@/components/ui/notice';
import { Body, Heading } from '@/components/ui/text';
import { space } from '@/constants/theme';
import type { Recorder } from '@/hooks/round/use-recorder';
import type { ReadyRound } from '@/hooks/round/use-round';
import type { Benchmark } from '@/shared/api/job-endpoints';
import type { RoundSeries } from '@/shared/round/round-state';
import { EntryPanel } from './entry-panel';
import type { EntryRules } from './read-entry';
import { RecordRow } from './record-row';
import { refusalWords } from './refusal-words';
import { useBenchmarkCheck, type BenchmarkCheck } from './use-benchmark-check';
import { useShootKeys } from './use-shoot-keys';

interface CheckPanelProps {
  view: ReadyRound;
  series: RoundSeries & { hi: Nm };
  rules: EntryRules;
  recorder: Recorder;
  benchmark: Benchmark;
  onDone: () => void;
}

/** The benchmark read once more. What it should read stays hidden until something is keyed, so that nobody reads what is hoped. */
export function CheckPanel({ onDone, benchmark, ...parts }: CheckPanelProps) {
  const { t } = useTranslation('shoot');
  const check = useBenchmarkCheck(parts, benchmark);
  const refusalId = useId();
  const field = useRef<TextInput>(null);
  const { rules } = parts;
  const settled = check.said?.said === 'held' || check.said?.said === 'doubted';
  useShootKeys({
    onRecord: settled ? onDone : check.record,
    onInch: (by, foot) => check.key({ kind: foot ? 'foot' : 'inch', by }),
    onErase: () => check.key({ kind: 'erase' }),
    field,
    enabled: true,
  });
  return (
    <View style={styles.panel}>
      <Heading level={2} size="title">
        {t('check.title', { benchmark: benchmark.name })}
      </Heading>
      {check.said ? <Said check={check} limit={parts.series.record.checkLimit} rules={rules} /> : null}
      {check.said ? null : <Body>{t('check.how', { benchmark: benchmark.name })}</Body>}
      {settled ? (
        <Button label={t('check.back')} variant="primary" size="large" onPress={onDone} />
      ) : (
        <>
          <FieldError id={refusalId} message={check.refusal ? refusalWords(check.refusal, rules.style) : undefined} />
          <EntryPanel
            ref={field}
            entry={check.entry}
            rules={rules}
            onKey={check.key}
            onSubmit={check.record}
            refused={check.refusal !== null}
            refusalId={refusalId}
          />
          <RecordRow label={t('check.record')} onRecord={check.record} entry={check.entry} rules={rules} onKey={check.key} keys />
          <Button label={t('check.back')} onPress={onDone} />
        </>
      )}
    </View>
  );
}

function Said({ check, limit, rules }: { check: BenchmarkCheck; limit: Nm; rules: EntryRules }) {
  const { t } = useTranslation('shoot');
  if (!check.said) return null;
  const { said, off, struck } = check.said;
  const words = {
    benchmark: check.benchmark.name,
    limit: printSmall(limit, rules.style),
    size: printSmall(Math.round(Math.abs(off) / rules.graduation) * rules.graduation, rules.style),
    side: t(off > 0 ? 'check.more' : 'check.less'),
  };
  const misread = struck ? ` ${t('check.misread')}` : '';
  switch (said) {
    case 'held':
      return (
        <Notice kind="good" announce lead={t('check.held')}>
          {`${t('check.heldHow', words)}${misread}`}
        </Notice>
      );
    case 'read-again':
      return (
        <Notice kind="caution" announce lead={t('check.again', words)}>
          {t('check.againHow', words)}
        </Notice>
      );
    case 'doubted':
      return (
        <Notice kind="refusal" lead={t('check.doubted')}>
          {`${t('check.doubtedHow', words)}${misread}`}
        </Notice>
      );
  }
}

const styles = StyleSheet.create({ panel: { gap: space.s } });
