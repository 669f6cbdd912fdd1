import type { FieldPath, FieldValues, UseFormSetError } from 'react-hook-form';
import { i18n } from '@/hooks/i18n/i18n';
import { ApiError } from '@/hooks/api/client';
import { describeError } from './describe-error';

/** What the server said of one field, in a sentence of the catalogue. */
function fieldSentence(code: string): string {
  const own = `errors:field.${code}`;
  if (i18n.exists(own)) return i18n.t(own as 'errors:field.invalid'); // exists() has just said that the key is there
  return i18n.t('errors:field.invalid');
}

/**
 * Puts what the server refused beside the fields that it named, the first of them focused.
 * @param fields the form's names, by the dotted path that the server knows them under
 * @returns a sentence for the whole form, or null where every refusal found its field
 */
export function placeRefusals<Values extends FieldValues>(
  error: unknown,
  setError: UseFormSetError<Values>,
  fields: Readonly<Record<string, FieldPath<Values>>>,
): string | null {
  if (!(error instanceof ApiError)) return describeError(error);
  const said = Object.entries(error.fields);
  let placed = 0;
  for (const [path, { code }] of said) {
    const name = fields[path];
    if (name === undefined) continue;
    setError(name, { type: 'server', message: fieldSentence(code) }, { shouldFocus: placed === 0 });
    placed += 1;
  }
  return placed > 0 && placed === said.length ? null : describeError(error);
}
