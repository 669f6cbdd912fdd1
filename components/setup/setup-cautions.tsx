import { useState } from 'react';
import { useTranslation } from 'react-i18next';
import { AnalysisError, type LengthStyle, type Nm } from '@/analysis';
import { LengthField } from '@/components/lengths/length-field';
import { readLength, type LengthRule } from '@/components/lengths/read-length';
import { Card } from '@/components/ui/card';
import { Notice } from '@/components/ui/notice';
import { Body } from '@/components/ui/text';
import { trenchCautions } from './trench-caution';

/** What to mind before the laser is switched on. */
export function LaserCaution() {
  const { t } = useTranslation('setup');
  return (
    <Notice kind="caution" lead={t('caution.laser')}>
      {t('caution.laserHow')}
    </Notice>
  );
}

function depthOf(text: string, rule: LengthRule): Nm | null {
  try {
    return readLength(text, rule);
  } catch (error) {
    if (error instanceof AnalysisError) return null; // unread is unknown; the field itself says why
    throw error;
  }
}

/** What to mind before anybody goes into the trench. It says more with depth, and never that nothing is needed. */
export function TrenchCaution({ thickness, style }: { thickness: Nm; style: LengthStyle }) {
  const { t } = useTranslation('setup');
  const [text, setText] = useState('');
  const rule: LengthRule = { style, bareDecimal: 'feet' };
  const cautions = trenchCautions(depthOf(text, rule), thickness);
  return (
    <Card ground="cautionTint" title={t('caution.trench')}>
      {cautions.map((caution) => (
        <Body key={caution}>{t(caution === 'trench' ? 'caution.trenchHow' : `caution.${caution}`)}</Body>
      ))}
      <Body weight="semibold">{t('caution.trenchGoverns')}</Body>
      <LengthField {...rule} label={t('caution.depth')} hint={t('caution.depthHint')} value={text} onChange={setText} optional />
    </Card>
  );
}
