import { QueryClientProvider } from '@tanstack/react-query';
import { useFonts } from 'expo-font';
import { useState, type ReactNode } from 'react';
import { StyleSheet, View } from 'react-native';
import { SafeAreaProvider, useSafeAreaInsets } from 'react-native-safe-area-context';
import { fontFiles } from '@/constants/fonts';
import { createQueryClient } from '@/hooks/api/query-client';
import { useSession } from '@/hooks/session/use-session';
import { useSessionStart } from '@/hooks/session/use-session-start';
import { useTokens } from '@/hooks/use-tokens';

/** What stands round every screen: fonts, the person's own cache, the silent sign-in, and the edges of the glass. */
export function Root({ children }: { children: ReactNode }) {
  // A font that is late or cannot be fetched costs its looks, not the screen.
  useFonts(fontFiles);
  useSessionStart();
  return (
    <SafeAreaProvider style={styles.fill}>
      <OwnCache>
        <InsideEdges>{children}</InsideEdges>
      </OwnCache>
    </SafeAreaProvider>
  );
}

/** A new cache as soon as somebody else, or the same person in another company, is signed in. */
function OwnCache({ children }: { children: ReactNode }) {
  const { me } = useSession();
  const owner = me === null ? 'nobody' : `${me.company.id}/${me.person.id}`;
  const [cache, setCache] = useState(() => ({ owner, client: createQueryClient() }));
  if (cache.owner !== owner) setCache({ owner, client: createQueryClient() });
  return <QueryClientProvider client={cache.client}>{children}</QueryClientProvider>;
}

function InsideEdges({ children }: { children: ReactNode }) {
  const tokens = useTokens();
  const { top, right, bottom, left } = useSafeAreaInsets();
  const edges = { paddingTop: top, paddingRight: right, paddingBottom: bottom, paddingLeft: left };
  return <View style={[styles.fill, edges, { backgroundColor: tokens.chalk }]}>{children}</View>;
}

const styles = StyleSheet.create({ fill: { flex: 1, minHeight: 0 } });
