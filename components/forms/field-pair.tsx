import { Children, type ReactNode } from 'react';
import { StyleSheet, View } from 'react-native';
import { space } from '@/constants/theme';

/** Fields that belong together, beside one another where there is room for both, else one under the other. */
export function FieldPair({ children }: { children: ReactNode }) {
  return (
    <View style={styles.pair}>
      {Children.map(children, (child) => (
        <View style={styles.part}>{child}</View>
      ))}
    </View>
  );
}

const styles = StyleSheet.create({
  pair: { flexDirection: 'row', flexWrap: 'wrap', gap: space.m, alignItems: 'flex-start' },
  part: { flexGrow: 1, flexShrink: 1, flexBasis: 150, minWidth: 0 },
});
