import { StyleSheet, View } from 'react-native';
import { Body, Figure } from '@/components/ui/text';
import { space } from '@/constants/theme';

/** What it is at the left, its figure at the right. */
export function FigureRow({ label, value, large = false }: { label: string; value: string; large?: boolean }) {
  return (
    <View role="group" aria-label={label} style={styles.row}>
      <Body style={styles.label}>{label}</Body>
      <Figure align="right" size={large ? 'head' : undefined} weight={large ? 'bold' : undefined}>
        {value}
      </Figure>
    </View>
  );
}

const styles = StyleSheet.create({
  row: {
    flexDirection: 'row',
    alignItems: 'baseline',
    justifyContent: 'space-between',
    flexWrap: 'wrap',
    columnGap: space.m,
    paddingVertical: 2,
  },
  label: { flexShrink: 1 },
});
