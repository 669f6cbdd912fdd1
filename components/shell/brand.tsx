import type { ReactNode } from 'react';
import { StyleSheet, Text, View } from 'react-native';
import { fonts } from '@/constants/fonts';
import { space, typeSize } from '@/constants/theme';
import { useTokens } from '@/hooks/use-tokens';
import { AppMark } from './app-mark';

/** The mark and the name; `pill` stands at the right of them on a phone. */
export function Brand({ pill, small = false }: { pill?: ReactNode; small?: boolean }) {
  const tokens = useTokens();
  const words = { color: tokens.ink, fontSize: small ? typeSize.head : typeSize.title };
  return (
    <View style={styles.row}>
      <AppMark size={small ? 30 : 34} />
      <Text style={[styles.name, words]}>Tallyrod</Text>
      {pill}
    </View>
  );
}

const styles = StyleSheet.create({
  row: { flexDirection: 'row', alignItems: 'center', gap: space.s + 2, paddingTop: space.m },
  name: { fontFamily: fonts.figureBold, flex: 1 },
});
