import type { TFunction } from 'i18next';

// A whole number of inches is not followed by a stroke: 11/16 is no 1 and 1/16.
const primes = /^(−|-)?(?:(\d+)′)?\s*(?:(\d+(?![\d/]))?\s*(?:(\d+)\/(\d+))?\s*″)?$/;

/** A fraction of an inch as it is said: "3 sixteenths". Denominators 2 to 64, halving; another is said "3 over 10". */
export function spokenFraction(numerator: number, denominator: number, t: TFunction<'common'>): string {
  switch (denominator) {
    case 2:
      return t('length.half', { count: numerator });
    case 4:
      return t('length.quarter', { count: numerator });
    case 8:
      return t('length.eighth', { count: numerator });
    case 16:
      return t('length.sixteenth', { count: numerator });
    case 32:
      return t('length.thirtySecond', { count: numerator });
    case 64:
      return t('length.sixtyFourth', { count: numerator });
    default:
      return t('length.over', { numerator, denominator });
  }
}

function spokenInches(
  whole: string | undefined,
  numerator: string | undefined,
  denominator: string | undefined,
  t: TFunction<'common'>,
) {
  const inches = whole === undefined ? null : Number(whole);
  const fraction = numerator && denominator ? spokenFraction(Number(numerator), Number(denominator), t) : null;
  if (fraction === null) return inches === null ? null : t('length.inches', { count: inches });
  return inches === null ? t('length.partOfInch', { fraction }) : t('length.inchesAnd', { inches, fraction });
}

/**
 * What a screen reader says for a length as `formatLength` prints it: `4′ 7 3/16″` is "4 feet 7 and 3 sixteenths inches",
 * `4.60 ft` "4.60 feet", `1.402 m` "1.402 metres". Text of any other form is returned as it is.
 */
export function spokenLength(text: string, t: TFunction<'common'>): string {
  const trimmed = text.trim();
  const sign = /^[−-]/.test(trimmed) ? `${t('length.minus')} ` : /^\+/.test(trimmed) ? `${t('length.plus')} ` : '';
  const bare = trimmed.replace(/^[−+-]\s*/, '');
  const decimal = /^(\d+(?:[.,]\d+)?)\s*(ft|mm|m)$/.exec(bare);
  if (decimal?.[1]) {
    const unit = decimal[2] === 'ft' ? t('length.ft') : decimal[2] === 'mm' ? t('length.mm') : t('length.m');
    return `${sign}${decimal[1]} ${unit}`;
  }
  const match = bare === '' ? null : primes.exec(bare);
  if (!match) return text;
  const feet = match[2] === undefined ? null : t('length.feet', { count: Number(match[2]) });
  const inches = spokenInches(match[3], match[4], match[5], t);
  return `${sign}${[feet, inches].filter((part) => part !== null).join(' ')}`;
}
