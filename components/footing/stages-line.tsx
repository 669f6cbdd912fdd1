import { useTranslation } from 'react-i18next';
import { StyleSheet, useWindowDimensions, View } from 'react-native';
import { space } from '@/constants/theme';
import { useTokens } from '@/hooks/use-tokens';
import { Icon } from '@/components/ui/icons';
import { Label } from '@/components/ui/text';

export const stageNames = ['outline', 'dig', 'rails', 'release', 'top', 'course'] as const;
export type StageName = (typeof stageNames)[number];

interface StagesLineProps {
  /** The stages that are behind, in any order: a dig may be marked not needed after the rails were shot. */
  done: readonly StageName[];
  /** Where the footing is now; null when all are done. */
  current: StageName | null;
}

/** The six stages of a footing in a row: a tick before those behind, the line under the one it is at. */
export function StagesLine({ done, current }: StagesLineProps) {
  const tokens = useTokens();
  const { t } = useTranslation('common');
  // Six names fill a phone's width; on a narrower one they go on to a second line, which reads better from the left.
  const apart = useWindowDimensions().width >= 380;
  return (
    <View role="list" aria-label={t('stage.list')} style={[styles.line, apart ? styles.apart : null]}>
      {stageNames.map((name) => {
        const state = name === current ? 'current' : done.includes(name) ? 'done' : 'ahead';
        return (
          <View
            key={name}
            role="listitem"
            aria-label={t(`stage.${state}`, { stage: t(`stage.${name}`) })}
            style={[styles.stage, { borderBottomColor: state === 'current' ? tokens.line : 'transparent' }]}
          >
            {state === 'done' ? <Icon name="tick" size={13} /> : null}
            <Label weight={state === 'ahead' ? 'medium' : 'bold'} tone={state === 'ahead' ? 'ink2' : 'ink'} size="small">
              {t(`stage.${name}`)}
            </Label>
          </View>
        );
      })}
    </View>
  );
}

const styles = StyleSheet.create({
  line: { flexDirection: 'row', flexWrap: 'wrap', columnGap: space.m, rowGap: space.xs, maxWidth: 440 },
  apart: { justifyContent: 'space-between', columnGap: space.s },
  stage: { flexDirection: 'row', alignItems: 'center', gap: 3, borderBottomWidth: 3, paddingBottom: 2 },
});
