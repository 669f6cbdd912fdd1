import { useTranslation } from 'react-i18next';
import { StyleSheet, View } from 'react-native';
import { Card } from '@/components/ui/card';
import { Body, Label } from '@/components/ui/text';
import { radius, space, type Tokens } from '@/constants/theme';
import { useTokens } from '@/hooks/use-tokens';
import type { RoundBundle } from '@/shared/api/round-endpoints';
import type { Shape } from '@/shared/round/round-results';
import type { RoundState } from '@/shared/round/round-state';
import { FigureRow } from './figure-row';
import { offGradeWords } from '../lengths/length-words';
import { printSmall } from '../lengths/print-length';
import { fallWords, distanceWords, tiltWords, toMark } from './results-words';

interface ShapeCardProps {
  bundle: RoundBundle;
  state: RoundState;
  shape: Shape;
}

/** How much of what is off is the whole footing, how much is tilt, how much humps and dips; and whether the laser may be why. */
export function ShapeCard({ bundle, state, shape }: ShapeCardProps) {
  const { t } = useTranslation('results');
  const { graduation, unitStyle } = bundle.job;
  const mark = (length: number) => toMark(length, graduation);
  const toward = fallWords(bundle, state, shape);
  const rest = mark(shape.rest);
  return (
    <Card title={t(state.out > 0 ? 'shape.title' : 'shape.titleGood')}>
      <SharesBar shape={shape} />
      <FigureRow label={t('shape.whole')} value={offGradeWords(mark(shape.offset), unitStyle)} />
      {shape.fit.model === 'level' ? null : (
        <FigureRow
          label={toward ? t('shape.falls', { toward }) : t('shape.level')}
          value={
            toward
              ? t('shape.drop', { drop: printSmall(mark(shape.drop), unitStyle), over: distanceWords(shape.over, bundle) })
              : t('shape.none')
          }
        />
      )}
      <FigureRow
        label={t('shape.rest')}
        value={rest === 0 ? t('shape.none') : t('shape.upTo', { size: printSmall(rest, unitStyle) })}
      />
      <Body>{tiltWords(bundle, state, shape)}</Body>
    </Card>
  );
}

const ground = (tokens: Tokens) => ({ offset: tokens.rule2, tilt: tokens.ink, rest: tokens.rule });
const PARTS = ['offset', 'tilt', 'rest'] as const;

function SharesBar({ shape }: { shape: Shape }) {
  const tokens = useTokens();
  const { t } = useTranslation('results');
  const { mostly } = shape;
  if (!mostly) return null;
  const colour = ground(tokens);
  return (
    <View role="img" aria-label={t('shape.barLabel', { mostly: t(`shape.mostly.${mostly}`) })} style={styles.bar}>
      {PARTS.filter((part) => shape.fit.shares[part] > 0.005).map((part) => (
        <View key={part} style={[styles.part, { flexGrow: shape.fit.shares[part], backgroundColor: colour[part] }]}>
          {part === mostly ? (
            <Label weight="bold" tone={part === 'rest' ? 'ink' : 'paper'} numberOfLines={1}>
              {t(`shape.mostly.${mostly}`)}
            </Label>
          ) : null}
        </View>
      ))}
    </View>
  );
}

const styles = StyleSheet.create({
  bar: { flexDirection: 'row', height: 30, borderRadius: radius.key - 2, overflow: 'hidden', marginBottom: space.xs },
  part: { flexBasis: 0, minWidth: 0, alignItems: 'center', justifyContent: 'center', overflow: 'hidden' },
});
