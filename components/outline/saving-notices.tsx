import { useQueryClient } from '@tanstack/react-query';
import { useTranslation } from 'react-i18next';
import { describeError } from '@/components/forms/describe-error';
import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import { footingQuery } from '@/hooks/api/footing-queries';
import type { OutlineEditor } from './use-outline-editor';

/** What became of saving: refused, overtaken by somebody else, or theirs loaded and one's own set aside. */
export function SavingNotices({ editor, footingId }: { editor: OutlineEditor; footingId: string }) {
  const { t } = useTranslation('outline');
  const client = useQueryClient();
  const { draft, dispatch, refusal, stale } = editor;
  const loadTheirs = async () => {
    const fresh = await client.fetchQuery({ ...footingQuery(footingId), staleTime: 0 });
    editor.loadTheirs(fresh);
  };
  return (
    <>
      {stale ? (
        <Notice
          kind="refusal"
          lead={t('saving.outOfDate')}
          actions={<Button label={t('saving.loadTheirs')} size="small" onPress={() => void loadTheirs()} />}
        >
          {t('saving.outOfDateHow')}
        </Notice>
      ) : null}
      {draft.setAside ? (
        <Notice
          kind="plain"
          lead={t('saving.setAside')}
          announce
          actions={<Button label={t('saving.takeBack')} size="small" onPress={() => dispatch({ type: 'take-back' })} />}
        >
          {t('saving.setAsideHow')}
        </Notice>
      ) : null}
      {refusal ? (
        <Notice kind="refusal" lead={t('saving.refused')}>
          {describeError(refusal)}
        </Notice>
      ) : null}
    </>
  );
}
