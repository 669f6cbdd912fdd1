import { useTranslation } from 'react-i18next';
import { describeError } from '@/components/forms/describe-error';
import { PlanView } from '@/components/charts/plan-view';
import { unitsOf } from '@/components/lengths/job-units';
import { LengthField } from '@/components/lengths/length-field';
import { Button } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { Column, Columns } from '@/components/ui/columns';
import { EmptyState } from '@/components/ui/empty-state';
import { ErrorState } from '@/components/ui/error-state';
import { LoadingState } from '@/components/ui/loading-state';
import { Notice } from '@/components/ui/notice';
import { Screen } from '@/components/ui/screen';
import { StatusPill } from '@/components/ui/status-pill';
import { Body } from '@/components/ui/text';
import { useFootingWithJob } from '@/hooks/api/use-footing-with-job';
import { useMay } from '@/hooks/session/use-session';
import { useWide } from '@/hooks/use-wide';
import type { Footing } from '@/shared/api/footing-schemas';
import type { Job } from '@/shared/api/job-endpoints';
import { StationList } from './station-list';
import { reachOf } from './station-preview';
import { useStationsEditor, type StationsEditor } from './use-stations-editor';

/** Where the rod is held: corners, both sides of every step, and between them no further apart than the spacing. */
export function StationsScreen({ footingId }: { footingId: string }) {
  const { t } = useTranslation('stations');
  const loaded = useFootingWithJob(footingId);
  if (loaded.status === 'ready') return <StationsEditing footing={loaded.footing} job={loaded.job} />;
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

function StationsEditing({ footing, job }: { footing: Footing; job: Job }) {
  const { t } = useTranslation('stations');
  const editor = useStationsEditor(footing, job);
  const may = useMay('station.write');
  const wide = useWide();
  const units = unitsOf(job);
  const { shown, error } = editor;
  return (
    <Screen
      title={t('title')}
      subtitle={wide ? undefined : t('subtitle', { footing: footing.name, job: job.name })}
      back={`/footings/${footing.id}`}
      crumbs={[
        { label: job.name, href: `/jobs/${job.id}` },
        { label: footing.name, href: `/footings/${footing.id}` },
      ]}
      pill={<StatusPill state={editor.laying ? 'sending' : 'on-server'} />}
      actions={<StationActions editor={editor} footing={footing} may={may} />}
    >
      {footing.runs.length === 0 ? (
        <EmptyState
          title={t('none.title')}
          action={<Button label={t('action.outline')} variant="primary" href={`/footings/${footing.id}/outline`} />}
        >
          {t('none.how')}
        </EmptyState>
      ) : (
        <Columns>
          <Column share={3}>
            {shown ? (
              <Card style={{ padding: 0 }}>
                <PlanView corners={shown.corners} closed={shown.closed} width={footing.width} stations={shown.stations} />
              </Card>
            ) : null}
            <Reach editor={editor} />
          </Column>
          <Column share={2}>
            {may ? <Spacing editor={editor} /> : <Notice kind="plain">{t('locked')}</Notice>}
            {error ? <Notice kind="refusal">{describeError(error)}</Notice> : null}
            {footing.stations.length > 0 ? <StationList editor={editor} footing={footing} units={units} may={may} /> : null}
            {may && footing.stations.length > 0 ? <AddStation editor={editor} /> : null}
          </Column>
        </Columns>
      )}
    </Screen>
  );
}

/** What shots of these stations will not be able to tell. */
function Reach({ editor: { shown } }: { editor: StationsEditor }) {
  const { t } = useTranslation('stations');
  if (!shown || shown.stations.length === 0) return null;
  const reach = reachOf(shown.stations);
  if (reach === 'plane') return null;
  const lead = reach === 'line' ? t('reach.line') : t('reach.level', { count: shown.stations.length });
  return (
    <Notice kind="caution" lead={lead}>
      {t(reach === 'line' ? 'reach.lineHow' : 'reach.levelHow')}
    </Notice>
  );
}

function Spacing({ editor }: { editor: StationsEditor }) {
  const { t } = useTranslation('stations');
  const { spacing, preview, asked, standing } = editor;
  return (
    <Card title={t('spacing.title')}>
      <LengthField
        {...spacing.rule}
        label={t('spacing.label')}
        hint={t('spacing.hint')}
        value={spacing.text}
        onChange={spacing.setText}
        error={spacing.refusal}
      />
      {spacing.tooWide ? (
        <Notice
          kind="caution"
          lead={t('spacing.tooWide', { edge: spacing.print(spacing.edge), most: spacing.print(spacing.usual) })}
          actions={
            <Button
              label={t('spacing.usual', { length: spacing.print(spacing.usual) })}
              variant="quiet"
              size="small"
              onPress={() => spacing.setText(spacing.print(spacing.usual))}
            />
          }
        >
          {t('spacing.tooWideHow')}
        </Notice>
      ) : null}
      {asked && preview ? (
        <Body>{t('spacing.count', { count: preview.stations.length, corners: preview.atCorners })}</Body>
      ) : null}
      {asked && standing ? <Body size="small">{t('spacing.again')}</Body> : null}
    </Card>
  );
}

function AddStation({ editor: { adding } }: { editor: StationsEditor }) {
  const { t } = useTranslation('stations');
  return (
    <Card title={t('add.title')}>
      <LengthField
        {...adding.rule}
        label={t('add.label')}
        hint={t('add.hint')}
        value={adding.text}
        onChange={adding.type}
        error={adding.refusal}
      />
      {adding.error ? <Notice kind="refusal">{describeError(adding.error)}</Notice> : null}
      <Button label={t('add.button')} busy={adding.busy} onPress={() => void adding.add()} />
    </Card>
  );
}

/** Lay them out; once they stand as asked for, back to the footing. */
function StationActions({ editor, footing, may }: { editor: StationsEditor; footing: Footing; may: boolean }) {
  const { t } = useTranslation('stations');
  if (footing.runs.length === 0) return null;
  if (!may || !editor.asked) {
    return <Button label={t('action.done')} variant="primary" size="large" grow href={`/footings/${footing.id}`} />;
  }
  const count = editor.preview?.stations.length ?? 0;
  return (
    <Button
      label={t('spacing.layOut', { count })}
      variant="primary"
      size="large"
      grow
      busy={editor.laying}
      disabled={editor.preview === null}
      onPress={() => void editor.layOut()}
    />
  );
}
