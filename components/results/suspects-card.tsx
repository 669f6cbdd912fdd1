import { useTranslation } from 'react-i18next';
import { StyleSheet, View } from 'react-native';
import { Button } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { Body, Strong } from '@/components/ui/text';
import { space } from '@/constants/theme';
import type { RoundBundle } from '@/shared/api/round-endpoints';
import type { RoundResults } from '@/shared/round/round-results';
import { MarkIcon } from '../charts/marks';
import { offGradeWords } from '../lengths/length-words';
import { printSmall } from '../lengths/print-length';
import { placeWords } from './place-words';
import { toMark } from './results-words';

interface SuspectsCardProps {
  bundle: RoundBundle;
  results: RoundResults;
  mayShoot: boolean;
}

/** Shots that stand out from the rest and what would explain them, then what was struck out. It asks; it drops nothing. */
export function SuspectsCard({ bundle, results, mayShoot }: SuspectsCardProps) {
  const { t } = useTranslation('results');
  const { suspects, struck } = results;
  return (
    <Card title={t('suspects.title')}>
      {suspects.length === 0 ? <Body tone="ink2">{t('suspects.none')}</Body> : null}
      {suspects.map((suspect) => {
        const place = placeWords(bundle.footing, suspect.target);
        const size = printSmall(Math.abs(toMark(suspect.size, bundle.job.graduation)), bundle.job.unitStyle);
        const side = t(suspect.size > 0 ? 'side.high' : 'side.low');
        return (
          <View key={suspect.id} style={styles.line}>
            <MarkIcon station={{ mark: 'in', suspect: true }} size={24} />
            <Body style={styles.words}>
              <Strong>{place}</Strong>
              {`: ${t('suspects.suspect', { size, side })} ${suspect.explanation ? t(`suspects.explain.${suspect.explanation}`) : ''}`}
            </Body>
            {mayShoot ? (
              <Button
                label={t('suspects.again')}
                spokenLabel={t('suspects.againLabel', { place })}
                size="small"
                href={{
                  pathname: '/rounds/[roundId]/shoot',
                  params: { roundId: bundle.round.id, station: suspect.target.stationId, rail: suspect.target.rail },
                }}
              />
            ) : null}
          </View>
        );
      })}
      {struck.map(({ shot, target }) => {
        const next = target.deciding?.deviation;
        return (
          <View key={shot.id} style={styles.line}>
            <Body style={styles.words}>
              <Strong>{placeWords(bundle.footing, target)}</Strong>
              {` ${t('suspects.struck', { reason: shot.struck ? t(`strike.${shot.struck.record.reason}`) : '' })} `}
              {next == null
                ? t('suspects.struckOpen')
                : t('suspects.struckReshot', {
                    deviation: offGradeWords(toMark(next, bundle.job.graduation), bundle.job.unitStyle),
                  })}
            </Body>
          </View>
        );
      })}
    </Card>
  );
}

const styles = StyleSheet.create({
  line: { flexDirection: 'row', alignItems: 'center', flexWrap: 'wrap', gap: space.m },
  words: { flexGrow: 1, flexShrink: 1, flexBasis: 160 },
});
