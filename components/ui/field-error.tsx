import { StyleSheet, View } from 'react-native';
import { space } from '@/constants/theme';
import { useTokens } from '@/hooks/use-tokens';
import { Body } from './text';

/**
 * The sentence beside a refused entry. The alert region is always in the page, because a region that arrives together with
 * its words is not announced everywhere.
 */
export function FieldError({ id, message }: { id: string; message?: string }) {
  const tokens = useTokens();
  return (
    <View id={id} role="alert">
      {message ? (
        <View style={[styles.row, { backgroundColor: tokens.cautionTint, borderLeftColor: tokens.caution }]}>
          <Body size="small" tone="ink">
            {message}
          </Body>
        </View>
      ) : null}
    </View>
  );
}

const styles = StyleSheet.create({
  row: { borderLeftWidth: 4, paddingVertical: space.s, paddingHorizontal: space.m },
});
