import { useTranslation } from 'react-i18next';
import { StyleSheet, View } from 'react-native';
import { space } from '@/constants/theme';
import { Body } from './text';

/** Says what is on its way. Nothing moves, so there is nothing to switch off. */
export function LoadingState({ label }: { label?: string }) {
  const { t } = useTranslation('common');
  return (
    <View role="status" aria-busy style={styles.box}>
      <Body tone="ink2">{label ?? t('state.loading')}</Body>
    </View>
  );
}

const styles = StyleSheet.create({ box: { padding: space.xl, alignItems: 'center' } });
