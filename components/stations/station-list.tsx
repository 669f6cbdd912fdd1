import { useState } from 'react';
import { useTranslation } from 'react-i18next';
import { StyleSheet, View } from 'react-native';
import { describeError } from '@/components/forms/describe-error';
import { toTheMark, type JobUnits } from '@/components/lengths/job-units';
import { LengthField, lengthRefusal } from '@/components/lengths/length-field';
import { printLength } from '@/components/lengths/print-length';
import { readLength, type LengthRule } from '@/components/lengths/read-length';
import { Button } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { ListRow } from '@/components/ui/list-row';
import { Notice } from '@/components/ui/notice';
import { Body } from '@/components/ui/text';
import { TextField } from '@/components/ui/text-field';
import { space } from '@/constants/theme';
import type { StationChange } from '@/hooks/api/footing-queries';
import type { Footing, Station } from '@/shared/api/footing-schemas';
import { stationTitle } from './station-preview';
import type { StationsEditor } from './use-stations-editor';

interface StationListProps {
  editor: StationsEditor;
  footing: Footing;
  units: JobUnits;
  may: boolean;
}

/** The stations that stand, in walking order; a press opens one to name or remove it. */
export function StationList({ editor, footing, units, may }: StationListProps) {
  const { t } = useTranslation('stations');
  const [open, setOpen] = useState<string | null>(null);
  const stations = [...footing.stations].sort((p, q) => p.position - q.position);
  // Where all stand on one grade, saying it at each says nothing.
  const stepped = stations.some(({ planGrade }) => planGrade !== footing.planGrade);
  return (
    <Card title={t('list.title')} note={t('list.count', { count: stations.length })}>
      <View role="list">
        {stations.map((station, index) => {
          const at = toTheMark(station.at, units);
          const side = station.step === null ? [] : [t(station.step === 'before' ? 'list.before' : 'list.after')];
          const grade = stepped ? [t('list.grade', { grade: toTheMark(station.planGrade, units) })] : [];
          return (
            <View key={station.id} role="listitem">
              <ListRow
                title={stationTitle(station)}
                note={[...side, ...grade].join(', ')}
                end={at}
                onPress={may ? () => setOpen(open === station.id ? null : station.id) : undefined}
                last={index === stations.length - 1}
              />
              {open === station.id ? (
                <StationEditor key={station.name} editor={editor} station={station} units={units} onClose={() => setOpen(null)} />
              ) : null}
            </View>
          );
        })}
      </View>
    </Card>
  );
}

interface StationEditorProps {
  editor: StationsEditor;
  station: Station;
  units: JobUnits;
  onClose: () => void;
}

/** Name a station, and while nothing is shot there move or remove it. */
function StationEditor({ editor, station, units, onClose }: StationEditorProps) {
  const { t } = useTranslation(['stations', 'errors']);
  const { changing, removing } = editor;
  const exact = printLength(station.at, units.style);
  const [name, setName] = useState(station.name);
  const [at, setAt] = useState(exact);
  const [refused, setRefused] = useState<{ name?: string; at?: string }>({});
  const fixed = station.corner !== null || station.step !== null;
  const rule: LengthRule = { style: units.style, sign: 'not-negative', bareDecimal: 'feet' };
  const save = () => {
    const unread = at === exact ? null : lengthRefusal(at, rule);
    if (name.trim() === '') return setRefused({ name: t('errors:field.required') });
    if (unread !== null) return setRefused({ at: unread });
    const change: StationChange = {
      ...(name.trim() === station.name ? {} : { name: name.trim() }),
      // Untouched, the distance stays what it is to the nanometre, not what it is printed as.
      ...(at === exact ? {} : { at: readLength(at, rule) }),
    };
    if (Object.keys(change).length === 0) return onClose();
    changing.mutate({ stationId: station.id, change }, { onSuccess: onClose });
  };
  const error = [
    changing.variables?.stationId === station.id ? changing.error : null,
    removing.variables === station.id ? removing.error : null,
  ].find((failed) => failed !== null);
  return (
    <View style={styles.editor}>
      <TextField
        label={t('edit.nameOf', { name: station.name })}
        value={name}
        onChangeText={(typed) => {
          setName(typed);
          setRefused({});
        }}
        onSubmitEditing={save}
        error={refused.name}
        maxLength={120}
        autoFocus
      />
      {fixed ? (
        <Body size="small">{t('edit.fixed')}</Body>
      ) : (
        <LengthField
          {...rule}
          label={t('edit.at', { name: station.name })}
          value={at}
          onChange={(typed) => {
            setAt(typed);
            setRefused({});
          }}
          error={refused.at}
        />
      )}
      {error ? <Notice kind="refusal">{describeError(error)}</Notice> : null}
      <View style={styles.buttons}>
        <Button label={t('edit.save')} size="small" busy={changing.isPending} onPress={save} />
        {fixed ? null : (
          <Button
            label={t('edit.remove', { name: station.name })}
            size="small"
            variant="plain"
            busy={removing.isPending}
            onPress={() => removing.mutate(station.id, { onSuccess: onClose })}
          />
        )}
        <Button label={t('edit.done')} size="small" variant="quiet" onPress={onClose} />
      </View>
    </View>
  );
}

const styles = StyleSheet.create({
  editor: { gap: space.s, paddingVertical: space.m },
  buttons: { flexDirection: 'row', flexWrap: 'wrap', gap: space.s },
});
