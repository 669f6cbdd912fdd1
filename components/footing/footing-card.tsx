import { StyleSheet, View } from 'react-native';
import { space } from '@/constants/theme';
import type { FootingSummary } from '@/shared/api/footing-schemas';
import { Card } from '@/components/ui/card';
import { Icon } from '@/components/ui/icons';
import { Body, Heading } from '@/components/ui/text';
import { footingWords } from './footing-words';
import { StagesLine } from './stages-line';

/** A footing as a line of a list: its name, its stages, and where it stands in a sentence. The whole card is the way there. */
export function FootingCard({ footing, showJob = false }: { footing: FootingSummary; showJob?: boolean }) {
  return (
    <Card href={{ pathname: '/footings/[footingId]', params: { footingId: footing.id } }} style={styles.card}>
      <View style={styles.head}>
        <View style={styles.names}>
          <Heading level={3} size="head">
            {footing.name}
          </Heading>
          {showJob ? (
            <Body size="small" tone="ink2">
              {footing.jobName}
            </Body>
          ) : null}
        </View>
        <Icon name="chevron-right" size={20} />
      </View>
      <StagesLine done={footing.stages.done} current={footing.stages.now} />
      <Body>{footingWords(footing)}</Body>
    </Card>
  );
}

const styles = StyleSheet.create({
  card: { gap: space.m },
  head: { flexDirection: 'row', alignItems: 'flex-start', gap: space.s },
  names: { flex: 1, minWidth: 0 },
});
