import type { ReactNode } from 'react';
import { StyleSheet, View } from 'react-native';
import { space } from '@/constants/theme';
import { useWide } from '@/hooks/use-wide';
import { Brand } from '@/components/shell/brand';
import { Screen } from '@/components/ui/screen';

/** The frame of the screens before the door: the brand, a narrow column, the button at its end. */
export function AuthFrame({ title, children }: { title: string; children: ReactNode }) {
  const wide = useWide();
  return (
    <Screen title={title} large brand={<Brand />} maxWidth={520}>
      {wide ? (
        <View style={styles.brand}>
          <Brand />
        </View>
      ) : null}
      {children}
    </Screen>
  );
}

const styles = StyleSheet.create({ brand: { marginTop: -space.s } });
