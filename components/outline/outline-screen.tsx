import { useRouter } from 'expo-router';
import { useState } from 'react';
import { useTranslation } from 'react-i18next';
import { View } from 'react-native';
import { describeError } from '@/components/forms/describe-error';
import { Button } from '@/components/ui/button';
import { Column, Columns } from '@/components/ui/columns';
import { EmptyState } from '@/components/ui/empty-state';
import { ErrorState } from '@/components/ui/error-state';
import { LoadingState } from '@/components/ui/loading-state';
import { Notice } from '@/components/ui/notice';
import { Screen } from '@/components/ui/screen';
import { StatusPill } from '@/components/ui/status-pill';
import { useFootingWithJob } from '@/hooks/api/use-footing-with-job';
import { useMay, useSession } from '@/hooks/session/use-session';
import { useWide } from '@/hooks/use-wide';
import type { Footing } from '@/shared/api/footing-schemas';
import type { Job } from '@/shared/api/job-endpoints';
import { unitsOf } from '@/components/lengths/job-units';
import { OutlineMeasures } from './outline-measures';
import { OutlineNotices } from './outline-notices';
import { OutlinePicture } from './outline-picture';
import { RunList } from './run-list';
import { SavingNotices } from './saving-notices';
import { ShapeForm } from './shape-form';
import { useOutlineEditor, type OutlineEditor } from './use-outline-editor';

/** The outline of a footing: runs in walking order, and the drawing that grows as they are typed. */
export function OutlineScreen({ footingId }: { footingId: string }) {
  const { t } = useTranslation('outline');
  const { me } = useSession();
  const loaded = useFootingWithJob(footingId);
  if (loaded.status === 'ready' && me) {
    return <OutlineEditing footing={loaded.footing} job={loaded.job} personId={me.person.id} />;
  }
  return (
    <Screen title={t('title')} back={`/footings/${footingId}`}>
      {loaded.status === 'failed' ? (
        <ErrorState title={describeError(loaded.error)} onRetry={loaded.tryAgain} />
      ) : (
        <LoadingState />
      )}
    </Screen>
  );
}

function OutlineEditing({ footing, job, personId }: { footing: Footing; job: Job; personId: string }) {
  const { t } = useTranslation('outline');
  const wide = useWide();
  const units = unitsOf(job);
  const editor = useOutlineEditor(footing, job, personId);
  const mayBefore = useMay('outline.change');
  const mayAfter = useMay('outline.change-after-shots');
  const may = mayBefore && (!footing.hasShots || mayAfter);
  const [shapes, setShapes] = useState(false);
  const { draft, dispatch, state, read } = editor;
  // On a phone the list would push it out of sight: it goes along with the run that is being typed.
  const goesAlong = !wide && may && draft.open !== null;
  const picture = (
    <OutlinePicture
      runs={read.drawn}
      state={state}
      width={footing.width}
      units={units}
      heights={goesAlong ? [120, 170] : undefined}
    />
  );
  const notices = <OutlineNotices editor={editor} units={units} may={may} />;
  // Refused beside the run that brought it about; what is only open still waits in its place above, and does not push the fields about.
  const crossesHere = goesAlong && state.kind === 'crosses';
  const along = goesAlong ? (
    <>
      {picture}
      <View role="status">{crossesHere ? notices : null}</View>
    </>
  ) : null;
  const measures = <OutlineMeasures editor={editor} units={units} />;
  const shapeForm = shapes ? (
    <ShapeForm
      units={units}
      replaces={draft.runs.length > 0}
      onFill={(runs) => {
        dispatch({ type: 'fill', runs });
        setShapes(false);
      }}
      onCancel={() => setShapes(false)}
    />
  ) : null;
  return (
    <Screen
      title={t('title')}
      subtitle={wide ? undefined : t('subtitle', { footing: footing.name, job: job.name })}
      back={`/footings/${footing.id}`}
      crumbs={[
        { label: job.name, href: `/jobs/${job.id}` },
        { label: footing.name, href: `/footings/${footing.id}` },
      ]}
      pill={
        <StatusPill state={editor.saving ? 'sending' : !draft.dirty ? 'on-server' : editor.kept ? 'on-phone' : 'needs-you'} />
      }
      actions={<OutlineActions editor={editor} footing={footing} may={may} />}
    >
      <Columns>
        <Column share={3}>
          {goesAlong ? null : picture}
          {may ? null : <Notice kind="plain">{t(mayBefore ? 'locked.shots' : 'locked.role')}</Notice>}
          <SavingNotices editor={editor} footingId={footing.id} />
          <View role="status">{crossesHere ? null : notices}</View>
          {wide ? measures : null}
        </Column>
        <Column share={2}>
          {draft.runs.length === 0 && !shapes ? (
            <EmptyState
              title={t('state.empty')}
              action={may ? <Button label={t('action.shapes')} onPress={() => setShapes(true)} /> : undefined}
            >
              {t('state.emptyHow')}
            </EmptyState>
          ) : null}
          {shapeForm}
          {draft.runs.length > 0 ? <RunList editor={editor} footing={footing} units={units} may={may} picture={along} /> : null}
          {draft.runs.length > 0 && !shapes && may ? (
            <Button label={t('action.shapesAgain')} variant="quiet" size="small" onPress={() => setShapes(true)} />
          ) : null}
          {wide ? null : measures}
        </Column>
      </Columns>
    </Screen>
  );
}

/** Add a run, and go on. An outline that misses closing can be kept as it is, but stations on it would stand in the wrong places. */
function OutlineActions({ editor, footing, may }: { editor: OutlineEditor; footing: Footing; may: boolean }) {
  const { t } = useTranslation('outline');
  const router = useRouter();
  const { state, draft } = editor;
  const goOn = state.kind === 'closes' || state.kind === 'strip';
  const press = async () => {
    if ((await editor.save()) && goOn) router.push(`/footings/${footing.id}/stations`);
  };
  if (!may) return <Button label={t('action.setStations')} href={`/footings/${footing.id}/stations`} size="large" grow />;
  return (
    <>
      <Button label={t('action.addRun')} onPress={editor.addRun} size="large" grow />
      {draft.runs.length === 0 ? null : (
        <Button
          label={t(goOn ? 'action.setStations' : 'action.save')}
          variant="primary"
          size="large"
          grow
          busy={editor.saving}
          disabled={state.kind === 'crosses'}
          onPress={() => void press()}
        />
      )}
    </>
  );
}
