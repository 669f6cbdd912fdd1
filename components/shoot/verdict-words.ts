import type { Nm } from '@/analysis';
import { toleranceWords } from '@/components/lengths/length-words';
import { printSmall } from '@/components/lengths/print-length';
import { i18n } from '@/hooks/i18n/i18n';
import type { RoundBundle } from '@/shared/api/round-endpoints';
import type { Surface } from '@/shared/rules';
import type { ShotVerdict } from './live-verdict';

export interface VerdictWords {
  tone: 'high' | 'low' | 'on';
  /** Which way the rail or the concrete must move; null where it stays as it is. */
  arrow: 'up' | 'down' | null;
  /** Large words before and after the length: RAISE 1/4″, 1/4″ LOW. */
  before: string;
  length: string | null;
  after: string;
  /** What else to do, in a few words. */
  advice: string | null;
  /** How it stands to what is allowed: "low, out of", and the limits. */
  side: string;
  limit: string;
}

/** Rounded to what the job reads to: "1/4″", "0.02 ft", "6 mm". */
export function markWords(length: Nm, { unitStyle, graduation }: RoundBundle['job']): string {
  return printSmall(Math.round(Math.abs(length) / graduation) * graduation, unitStyle);
}

/** The words of a verdict on a surface, in the words of that surface. */
export function verdictWords({ deviation, verdict, close }: ShotVerdict, bundle: RoundBundle): VerdictWords {
  const { surface } = bundle.round;
  const out = verdict === 'high' || verdict === 'low';
  const side: 'low' | 'high' = deviation < 0 ? 'low' : 'high';
  const onGrade = Math.round(Math.abs(deviation) / bundle.job.graduation) === 0;
  const standing = out ? i18n.t(`shoot:side.${side}Out`) : close ? i18n.t('shoot:side.close') : i18n.t('shoot:side.in');
  const common: Pick<VerdictWords, 'tone' | 'side' | 'limit'> = {
    tone: out ? side : 'on',
    side: standing,
    limit: toleranceWords(bundle.toleranceRule),
  };
  if (onGrade) return { ...common, arrow: null, before: i18n.t('shoot:verdict.on'), length: null, after: '', advice: null };
  return { ...common, length: markWords(deviation, bundle.job), ...actionWords(surface, side, out) };
}

/** Stands for the length, which is drawn apart from the words. */
const GAP = '\u2007';

function actionWords(
  surface: Surface,
  side: 'low' | 'high',
  out: boolean,
): Pick<VerdictWords, 'arrow' | 'before' | 'after' | 'advice'> {
  // The language decides on which side of its words the length stands.
  const [before = '', after = ''] = i18n
    .t(`shoot:verdict.${surface}.${side}`, { length: GAP })
    .split(GAP)
    .map((part) => part.trim());
  if (surface === 'dig' && side === 'low') return { arrow: null, before, after, advice: i18n.t('shoot:advice.pourFull') };
  if (surface === 'top')
    return { arrow: null, before, after, advice: side === 'high' && out ? i18n.t('shoot:advice.grind') : null };
  return { arrow: side === 'low' ? 'up' : 'down', before, after, advice: null };
}

/** The whole verdict as a sentence for the ear. */
export function spokenVerdict(words: VerdictWords, say: (length: string) => string): string {
  const action = [words.before, words.length === null ? '' : say(words.length), words.after]
    .filter((part) => part !== '')
    .join(' ');
  return [action.toLocaleLowerCase(), words.advice, `${words.side} ${words.limit}`].filter((part) => part !== null).join('. ');
}
