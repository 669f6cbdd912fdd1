import { lazy, Suspense } from 'react';
import { useTranslation } from 'react-i18next';
import { View } from 'react-native';
import { Body } from '@/components/ui/text';
import type { ProfileVictoryProps } from './profile-victory';

// The charting library weighs as much as a screen and a half: it comes by itself, after the answers are read. This is the one
// place that asks for it, because a module that two routes import would move into the bundle that every page loads.
const ProfileVictory = lazy(() => import('./profile-victory'));

/** The profile around the footing, with zoom and a reading line; loads its library when it is first shown. */
export function ProfileChart(props: ProfileVictoryProps) {
  const { t } = useTranslation('charts');
  const waiting = (
    <View role="status" style={{ height: (props.height ?? 240) + 100, justifyContent: 'center' }}>
      <Body tone="ink2" align="center">
        {t('profile.loading')}
      </Body>
    </View>
  );
  return (
    <Suspense fallback={waiting}>
      <ProfileVictory {...props} />
    </Suspense>
  );
}
