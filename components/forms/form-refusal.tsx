import { Notice } from '@/components/ui/notice';

/** Why the whole form was not taken; what belongs to one field stands beside that field. */
export function FormRefusal({ sentence }: { sentence: string | null }) {
  return sentence === null ? null : <Notice kind="refusal">{sentence}</Notice>;
}
