import { Children, type ReactNode } from 'react';
import { StyleSheet, View } from 'react-native';
import { space } from '@/constants/theme';

/** Cards of one kind, as many beside one another as there is room for at `least` px each. */
export function Tiles({ children, least = 320 }: { children: ReactNode; least?: number }) {
  return (
    <View style={styles.tiles}>
      {Children.map(children, (child) => (
        <View style={[styles.tile, { flexBasis: least }]}>{child}</View>
      ))}
    </View>
  );
}

const styles = StyleSheet.create({
  tiles: { flexDirection: 'row', flexWrap: 'wrap', gap: space.m },
  // Grows to fill its row, but a lone one is no banner; shrinks under `least` on a narrow phone.
  tile: { flexGrow: 1, flexShrink: 1, minWidth: 0, maxWidth: 640 },
});
