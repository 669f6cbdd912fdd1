import { useTranslation } from 'react-i18next';
import { StyleSheet, View } from 'react-native';
import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import { space } from '@/constants/theme';
import type { Shooting } from './use-shooting';

/** Everything of a lap is shot: what that is worth, and where to go from here. */
export function LapEnd({ shooting, onCheck }: { shooting: Shooting; onCheck: () => void }) {
  const { t } = useTranslation('shoot');
  const { view, lap, series } = shooting;
  const { state, bundle } = view;
  const count = state.targets.length;
  const unchecked = state.targets.some((target) => target.deciding?.laser === 'unchecked');
  const words = [
    unchecked ? t('lap.checkFirst') : null,
    bundle.round.surface === 'rails' ? t(state.wholeReadLap ? 'lap.wholeLap' : 'lap.notWhole') : null,
  ].filter((part) => part !== null);
  const mayCheck = unchecked && series !== null;
  const results = (
    <Button
      label={t('lap.results')}
      variant={mayCheck ? 'outline' : 'primary'}
      size="large"
      grow
      href={{ pathname: '/rounds/[roundId]/results', params: { roundId: bundle.round.id } }}
    />
  );
  return (
    <>
      <Notice kind="good" announce lead={lap === 1 ? t('lap.done', { count }) : t('lap.doneLap', { count, lap })}>
        {words.join(' ')}
      </Notice>
      <View style={styles.row}>
        <Button label={t('lap.next', { lap: lap + 1 })} size="large" grow onPress={shooting.startNextLap} />
        {results}
      </View>
      {mayCheck ? <Button label={t('check.button')} variant="primary" size="large" onPress={onCheck} /> : null}
    </>
  );
}

const styles = StyleSheet.create({ row: { flexDirection: 'row', flexWrap: 'wrap', gap: space.s } });
