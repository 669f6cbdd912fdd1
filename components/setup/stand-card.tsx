import { useTranslation } from 'react-i18next';
import { StyleSheet, View } from 'react-native';
import { PlanView } from '@/components/charts/plan-view';
import { LengthField } from '@/components/lengths/length-field';
import { Button } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { Body } from '@/components/ui/text';
import { space } from '@/constants/theme';
import type { ReadyRound } from '@/hooks/round/use-round';
import { standingStations } from '@/components/stations/station-preview';
import { besideCorner, cornersOf, farthestWords, middleOf, placeWords } from './stand-places';
import type { Setup } from './use-setup';

/** Where the laser stands on the plan, by a press, by the arrow keys, or by the nearest corner; and how far the benchmark is. */
export function StandCard({ setup, view }: { setup: Setup; view: ReadyRound }) {
  const { t } = useTranslation('setup');
  const { bundle, state } = view;
  const { footing, job } = bundle;
  const style = job.unitStyle;
  const corners = cornersOf(footing);
  const plan = standingStations(footing);
  const { stand, fixed } = setup;
  return (
    <Card title={t('stand.title')}>
      <Body size="small" tone="ink2">
        {t('stand.how')}
      </Body>
      <PlanView
        corners={plan.corners}
        closed={plan.closed}
        width={footing.width}
        stations={plan.stations}
        laser={stand}
        onPressPlace={fixed ? undefined : setup.setStand}
        placeText={(place) => placeWords(place, corners, style)}
      />
      <View role="status">
        {stand === null ? (
          <Body size="small">{t('stand.open')}</Body>
        ) : (
          <Body size="small">
            {placeWords(stand, corners, style)}. {farthestWords(stand, state.targets, footing, style)}
          </Body>
        )}
      </View>
      {fixed ? null : (
        <View style={styles.near}>
          {corners.map((corner) => (
            <Button
              key={corner.corner}
              label={t('stand.near', { corner: corner.corner })}
              variant="plain"
              size="small"
              onPress={() => setup.setStand(besideCorner(corner, corners))}
            />
          ))}
          {corners.length > 2 ? (
            <Button label={t('stand.middle')} variant="plain" size="small" onPress={() => setup.setStand(middleOf(corners))} />
          ) : null}
          {stand === null ? null : (
            <Button label={t('stand.clear')} variant="quiet" size="small" onPress={() => setup.setStand(null)} />
          )}
        </View>
      )}
      <LengthField
        {...setup.distanceRule}
        label={t('stand.distance')}
        hint={t('stand.distanceHint')}
        value={setup.distance}
        onChange={setup.setDistance}
        error={setup.refusalAt('distance')}
        disabled={fixed}
        optional
      />
    </Card>
  );
}

const styles = StyleSheet.create({
  near: { flexDirection: 'row', flexWrap: 'wrap', gap: space.s },
});
