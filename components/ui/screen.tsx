import { Link, type Href } from 'expo-router';
import { Fragment, useEffect, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Platform, Pressable, ScrollView, StyleSheet, View } from 'react-native';
import { space, target } from '@/constants/theme';
import { useTokens } from '@/hooks/use-tokens';
import { useWide } from '@/hooks/use-wide';
import { Icon } from './icons';
import { Body, Heading } from './text';

export interface Crumb {
  label: string;
  href?: Href;
}

interface ScreenProps {
  title: string;
  subtitle?: string;
  /** Where the chevron leads: one step up. Without it there is no chevron. */
  back?: Href;
  /** From the outermost in; drawn above the title from 900 px. */
  crumbs?: readonly Crumb[];
  /** At the right of the header: a `StatusPill`. */
  pill?: ReactNode;
  /** Above the header, on a phone only, where no rail shows it: the brand. */
  brand?: ReactNode;
  /** There is no rail at any width, so the brand is drawn at every one. */
  withoutRail?: boolean;
  /** The screen's buttons, at most one of them primary: at the thumb on a phone, at the right of the header from 900 px. */
  actions?: ReactNode;
  /** The header is drawn larger: for the first screen of a tab. */
  large?: boolean;
  /** The body fills the window and does not scroll by itself. */
  fixed?: boolean;
  /** Widest that the body grows, in px. */
  maxWidth?: number;
  children: ReactNode;
}

/** The frame of every screen: header, body, and the bar of buttons at the thumb. */
export function Screen({ maxWidth = 1480, ...props }: ScreenProps) {
  const tokens = useTokens();
  const wide = useWide();
  useEffect(() => {
    if (Platform.OS === 'web') document.title = `${props.title} · Tallyrod`;
  }, [props.title]);
  const body = (
    <View style={[wide ? styles.wideBody : styles.body, props.fixed ? styles.fill : null, { maxWidth }]}>
      {wide && !props.withoutRail ? null : props.brand}
      {wide ? <WideHeader {...props} /> : <PhoneHeader {...props} />}
      {props.children}
    </View>
  );
  return (
    <View role="main" style={[styles.fill, { backgroundColor: tokens.chalk }]}>
      {props.fixed ? (
        body
      ) : (
        <ScrollView tabIndex={0} style={styles.fill} contentContainerStyle={styles.scrolled}>
          {body}
        </ScrollView>
      )}
      {!wide && props.actions ? <View style={[styles.bar, { backgroundColor: tokens.chalk }]}>{props.actions}</View> : null}
    </View>
  );
}

function PhoneHeader({ title, subtitle, back, pill, large }: Omit<ScreenProps, 'children'>) {
  return (
    <View style={styles.header}>
      {back === undefined ? null : <Back to={back} />}
      <View style={styles.titles}>
        <Heading level={1} size={large ? 'verdict' : 'head'}>
          {title}
        </Heading>
        {subtitle ? (
          <Body size="small" tone="ink2">
            {subtitle}
          </Body>
        ) : null}
      </View>
      {pill}
    </View>
  );
}

function WideHeader({ title, subtitle, crumbs = [], pill, actions }: Omit<ScreenProps, 'children'>) {
  return (
    <View style={[styles.header, styles.wideHeader]}>
      <View style={styles.titles}>
        {crumbs.length > 0 ? <Crumbs crumbs={crumbs} /> : null}
        <Heading level={1} size="title">
          {title}
        </Heading>
        {subtitle ? (
          <Body size="small" tone="ink2">
            {subtitle}
          </Body>
        ) : null}
      </View>
      {pill}
      {actions ? <View style={styles.wideActions}>{actions}</View> : null}
    </View>
  );
}

function Crumbs({ crumbs }: { crumbs: readonly Crumb[] }) {
  const { t } = useTranslation('common');
  return (
    <View role="navigation" aria-label={t('nav.crumbs')}>
      <Body size="tiny" tone="ink2">
        {crumbs.map((crumb, at) => (
          <Fragment key={crumb.label}>
            {at > 0 ? ' › ' : ''}
            {crumb.href === undefined ? crumb.label : <Link href={crumb.href}>{crumb.label}</Link>}
          </Fragment>
        ))}
      </Body>
    </View>
  );
}

// Up, not history: a person who opened the address from a message comes to the same place.
function Back({ to }: { to: Href }) {
  const { t } = useTranslation('common');
  return (
    <Link href={to} asChild>
      <Pressable role="link" aria-label={t('action.back')} style={styles.back}>
        <Icon name="chevron-left" size={24} />
      </Pressable>
    </Link>
  );
}

const styles = StyleSheet.create({
  fill: { flex: 1, minHeight: 0 },
  scrolled: { flexGrow: 1, alignItems: 'center' },
  body: { width: '100%', alignSelf: 'center', paddingHorizontal: space.l - 2, paddingBottom: space.l, gap: space.m },
  wideBody: { width: '100%', alignSelf: 'center', paddingHorizontal: space.xl, paddingBottom: space.xl, gap: space.l },
  header: { flexDirection: 'row', alignItems: 'center', flexWrap: 'wrap', gap: space.s, paddingTop: space.m, minHeight: 56 },
  wideHeader: { paddingTop: space.xl - 2 },
  titles: { flexGrow: 1, flexShrink: 1, flexBasis: 120, minWidth: 0 },
  back: {
    width: target.least,
    height: target.least,
    marginLeft: -(space.l - 2),
    marginRight: -space.s,
    alignItems: 'center',
    justifyContent: 'center',
  },
  bar: {
    flexDirection: 'row',
    flexWrap: 'wrap',
    gap: space.s,
    paddingHorizontal: space.l - 2,
    paddingTop: space.s,
    paddingBottom: space.m,
  },
  wideActions: { flexDirection: 'row', flexWrap: 'wrap', gap: space.s },
});
