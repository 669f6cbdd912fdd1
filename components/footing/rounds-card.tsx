import { useTranslation } from 'react-i18next';
import { StyleSheet, View } from 'react-native';
import { space } from '@/constants/theme';
import { momentWords } from '@/components/time/day-words';
import { Button } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { Body, Heading } from '@/components/ui/text';
import { useTokens } from '@/hooks/use-tokens';
import type { Footing, RoundSummary } from '@/shared/api/footing-schemas';
import type { Role } from '@/shared/roles';
import { newestFirst, openSurfaces } from './next-step';
import { roundName, roundWords } from './round-words';

/** The rounds of a footing, newest first: how far, the verdict in words, and where to go in each. */
export function RoundsCard({ footing, roles }: { footing: Footing; roles: readonly Role[] }) {
  const { t } = useTranslation('footing');
  const mine = openSurfaces(footing, roles);
  const rounds = newestFirst(footing.rounds);
  return (
    <Card title={t('rounds.title')}>
      {rounds.length === 0 ? <Body tone="ink2">{t('rounds.none')}</Body> : null}
      {rounds.map((round, at) => (
        <RoundLines key={round.id} round={round} mayShoot={mine.includes(round.surface)} last={at === rounds.length - 1} />
      ))}
    </Card>
  );
}

function RoundLines({ round, mayShoot, last }: { round: RoundSummary; mayShoot: boolean; last: boolean }) {
  const { t } = useTranslation('footing');
  const tokens = useTokens();
  const name = roundName(round);
  const params = { roundId: round.id };
  const open = round.closedAt === null;
  return (
    <View style={[styles.round, last ? null : { borderBottomWidth: 1, borderBottomColor: tokens.rule }]}>
      <View style={styles.words}>
        <Heading level={3}>{name}</Heading>
        <Body>{roundWords(round)}</Body>
        <Body size="small" tone="ink2">
          {t(open ? 'rounds.open' : 'rounds.closed', { who: round.openedBy, when: momentWords(round.openedAt) })}
        </Body>
      </View>
      <View style={styles.ways}>
        <Button
          variant="quiet"
          size="small"
          label={t('rounds.results')}
          spokenLabel={t('rounds.resultsOf', { round: name })}
          href={{ pathname: '/rounds/[roundId]/results', params }}
        />
        {open && mayShoot ? (
          <>
            <Button
              variant="quiet"
              size="small"
              label={t('rounds.setup')}
              spokenLabel={t('rounds.setupOf', { round: name })}
              href={{ pathname: '/rounds/[roundId]/setup', params }}
            />
            <Button
              variant="quiet"
              size="small"
              label={t('rounds.shoot')}
              spokenLabel={t('rounds.shootOf', { round: name })}
              href={{ pathname: '/rounds/[roundId]/shoot', params }}
            />
          </>
        ) : null}
      </View>
    </View>
  );
}

const styles = StyleSheet.create({
  round: { paddingVertical: space.s },
  words: { gap: 2 },
  ways: { flexDirection: 'row', flexWrap: 'wrap', columnGap: space.l },
});
