import type { ReactNode } from 'react';
import { Pressable, StyleSheet, View } from 'react-native';
import { space, target } from '@/constants/theme';
import { useTokens } from '@/hooks/use-tokens';
import { Figure, Label } from './text';

export interface TableColumn {
  key: string;
  title: string;
  align?: 'left' | 'right';
  /** Share of the width: 1 unless said. */
  share?: number;
}

export interface TableRow {
  key: string;
  /** By column key. A string is set as a figure; an element is drawn as it is. */
  cells: Readonly<Record<string, ReactNode>>;
  /** You are here: a bar in the line's colour at the left. */
  current?: boolean;
}

interface TableProps {
  /** What the table lists: read out before it. */
  label: string;
  columns: readonly TableColumn[];
  rows: readonly TableRow[];
  /** The first cell of each row becomes a button that calls this. */
  onPressRow?: (key: string) => void;
  /** 34 px rows for an office screen where nothing is pressed; 48 otherwise. */
  dense?: boolean;
}

/** A table with a table's roles, so that a screen reader can walk it by cell. */
export function Table({ label, columns, rows, onPressRow, dense = false }: TableProps) {
  const tokens = useTokens();
  const line = { borderBottomColor: tokens.rule };
  const minHeight = dense && !onPressRow ? 34 : target.least;
  return (
    <View role="table" aria-label={label}>
      <View role="rowgroup">
        <View role="row" style={[styles.row, line]}>
          {columns.map((column) => (
            <View key={column.key} role="columnheader" style={[styles.head, cellBox(column)]}>
              <Label size="tiny" weight="semibold" align={column.align}>
                {column.title}
              </Label>
            </View>
          ))}
        </View>
      </View>
      <View role="rowgroup">
        {rows.map((row, at) => (
          <View
            key={row.key}
            role="row"
            aria-current={row.current || undefined}
            style={[
              styles.row,
              { minHeight },
              at < rows.length - 1 ? line : styles.last,
              row.current ? { backgroundColor: tokens.lineTint, boxShadow: `inset 4px 0 0 ${tokens.line}` } : null,
            ]}
          >
            {columns.map((column, place) => (
              <View key={column.key} role="cell" style={[styles.cell, cellBox(column)]}>
                <Cell
                  column={column}
                  content={row.cells[column.key]}
                  onPress={onPressRow && place === 0 ? () => onPressRow(row.key) : undefined}
                />
              </View>
            ))}
          </View>
        ))}
      </View>
    </View>
  );
}

function Cell({ column, content, onPress }: { column: TableColumn; content: ReactNode; onPress?: () => void }) {
  const words =
    typeof content === 'string' || typeof content === 'number' ? (
      <Figure size="small" align={column.align}>
        {content}
      </Figure>
    ) : (
      content
    );
  if (!onPress) return words;
  return (
    <Pressable role="button" onPress={onPress} style={styles.press}>
      {words}
    </Pressable>
  );
}

const cellBox = (column: TableColumn) =>
  ({ flexGrow: column.share ?? 1, alignItems: column.align === 'right' ? 'flex-end' : 'flex-start' }) as const;

const styles = StyleSheet.create({
  row: { flexDirection: 'row', alignItems: 'center', borderBottomWidth: 1, paddingHorizontal: space.l, columnGap: space.s },
  last: { borderBottomWidth: 0 },
  head: { flexBasis: 0, flexShrink: 1, paddingVertical: space.s },
  cell: { flexBasis: 0, flexShrink: 1, paddingVertical: space.xs },
  press: { minHeight: target.least, alignSelf: 'stretch', justifyContent: 'center' },
});
