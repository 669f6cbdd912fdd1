import { Link, usePathname } from 'expo-router';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Pressable, StyleSheet, View } from 'react-native';
import { radius, space, target } from '@/constants/theme';
import { useTokens } from '@/hooks/use-tokens';
import { useWide } from '@/hooks/use-wide';
import { Body, Label } from '@/components/ui/text';
import { Brand } from './brand';
import { isTopLevel, placeOf, places, type PlaceKey } from './places';

interface AppShellProps {
  /** The person's role or roles in words: "super". */
  signedInAs: string;
  company: string;
  children: ReactNode;
}

/** What stands round every screen of a signed-in person: tabs under it on a phone, a rail beside it from 900 px. */
export function AppShell({ signedInAs, company, children }: AppShellProps) {
  const wide = useWide();
  const pathname = usePathname();
  const here = placeOf(pathname);
  if (wide) {
    return (
      <View style={styles.beside}>
        <Rail here={here} signedInAs={signedInAs} company={company} />
        <View style={styles.body}>{children}</View>
      </View>
    );
  }
  return (
    <View style={styles.over}>
      <View style={styles.body}>{children}</View>
      {isTopLevel(pathname) ? <Tabs here={here} /> : null}
    </View>
  );
}

function Tabs({ here }: { here: PlaceKey | null }) {
  const tokens = useTokens();
  const { t } = useTranslation('common');
  return (
    <View
      role="navigation"
      aria-label={t('nav.main')}
      style={[styles.tabs, { backgroundColor: tokens.paper, borderTopColor: tokens.rule }]}
    >
      {places.map(({ key, href }) => (
        <Link key={key} href={href} asChild>
          <Pressable
            role="link"
            aria-current={key === here ? 'page' : undefined}
            style={StyleSheet.flatten([styles.tab, { borderTopColor: key === here ? tokens.line : 'transparent' }])}
          >
            <Label weight={key === here ? 'bold' : 'semibold'} tone={key === here ? 'ink' : 'ink2'} align="center">
              {t(`nav.${key}`)}
            </Label>
          </Pressable>
        </Link>
      ))}
    </View>
  );
}

function Rail({ here, signedInAs, company }: { here: PlaceKey | null; signedInAs: string; company: string }) {
  const tokens = useTokens();
  const { t } = useTranslation('common');
  return (
    <View
      role="navigation"
      aria-label={t('nav.main')}
      style={[styles.rail, { backgroundColor: tokens.paper, borderRightColor: tokens.rule }]}
    >
      <Brand small />
      <View style={styles.links}>
        {places.map(({ key, href }) => (
          <Link key={key} href={href} asChild>
            <Pressable
              role="link"
              aria-current={key === here ? 'page' : undefined}
              style={StyleSheet.flatten([
                styles.link,
                key === here
                  ? { backgroundColor: tokens.chalk, borderLeftColor: tokens.line }
                  : { backgroundColor: 'transparent', borderLeftColor: 'transparent' },
              ])}
            >
              <Label size="lead" weight={key === here ? 'bold' : 'semibold'} tone={key === here ? 'ink' : 'ink2'}>
                {t(`nav.${key}`)}
              </Label>
            </Pressable>
          </Link>
        ))}
      </View>
      <Link href="/account" asChild>
        <Pressable role="link" style={styles.account}>
          <Body size="tiny" tone="ink2">
            {t('shell.signedInAs', { role: signedInAs })}
          </Body>
          <Body size="tiny" weight="bold">
            {company}
          </Body>
        </Pressable>
      </Link>
    </View>
  );
}

const styles = StyleSheet.create({
  beside: { flex: 1, flexDirection: 'row', minHeight: 0 },
  over: { flex: 1, minHeight: 0 },
  body: { flex: 1, minWidth: 0, minHeight: 0 },
  tabs: { flexDirection: 'row', borderTopWidth: 1 },
  tab: { flex: 1, minHeight: 62, alignItems: 'center', justifyContent: 'center', borderTopWidth: 3, marginTop: -1 },
  rail: { width: 190, borderRightWidth: 1, paddingTop: space.s, paddingHorizontal: space.m + 2, paddingBottom: space.xl },
  links: { flex: 1, paddingTop: space.xl, gap: 2 },
  link: {
    minHeight: target.least,
    justifyContent: 'center',
    paddingHorizontal: space.s,
    borderLeftWidth: 4,
    borderRadius: radius.key,
  },
  account: { minHeight: target.least, justifyContent: 'center' },
});
