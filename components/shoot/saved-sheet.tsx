import { useState } from 'react';
import { useTranslation } from 'react-i18next';
import { ScrollView, StyleSheet, View } from 'react-native';
import { Button } from '@/components/ui/button';
import { Body, Strong } from '@/components/ui/text';
import { space } from '@/constants/theme';
import { browserOutbox } from '@/hooks/outbox/browser-outbox';
import type { KeptRecord } from '@/hooks/outbox/outbox-storage';
import { useOutbox } from '@/hooks/outbox/use-outbox';
import { REFUSALS, type Refusal } from '@/shared/records';
import { recordWords } from './record-words';
import { Sheet } from './sheet';

/** Where everything recorded is: on this phone, on the server, or refused, and what can be done about each. */
export function SavedSheet({ onClose }: { onClose: () => void }) {
  const { t } = useTranslation('shoot');
  const { kept } = useOutbox();
  const refused = kept.filter((record) => record.refused !== null);
  const waiting = kept.length - refused.length;
  const words = [
    waiting > 0 ? t('saved.onPhone', { count: waiting }) : null,
    refused.length > 0 ? t('saved.needsYou', { count: refused.length }) : null,
    kept.length === 0 ? t('saved.allOnServer') : null,
  ];
  return (
    <Sheet
      title={t('saved.title')}
      onClose={onClose}
      actions={
        <>
          {refused.length > 0 ? (
            <ScrollView style={styles.list} contentContainerStyle={styles.items}>
              {refused.map((record) => (
                <RefusedRecord key={record.id} kept={record} />
              ))}
            </ScrollView>
          ) : null}
          {waiting > 0 ? <Button label={t('saved.sendNow')} onPress={() => browserOutbox().send()} /> : null}
          <Button label={t('saved.close')} size="large" variant="primary" onPress={onClose} />
        </>
      }
    >
      {words.filter((part) => part !== null).join(' ')}
    </Sheet>
  );
}

const isRefusal = (refused: KeptRecord['refused']): refused is Refusal => REFUSALS.some((one) => one === refused);

function RefusedRecord({ kept }: { kept: KeptRecord }) {
  const { t } = useTranslation('shoot');
  const [sure, setSure] = useState(false);
  const why = isRefusal(kept.refused) || kept.refused === 'conflict' ? kept.refused : 'other';
  return (
    <View style={styles.item}>
      <Body>
        <Strong>{recordWords(kept.record)}</Strong>
        {` ${t(`saved.refused.${why}`)}`}
      </Body>
      <View style={styles.buttons}>
        <Button label={t('saved.again')} size="small" onPress={() => void browserOutbox().sendAgain([kept.id])} />
        <Button
          label={sure ? t('saved.letGoSure') : t('saved.letGo')}
          size="small"
          variant="plain"
          onPress={() => (sure ? void browserOutbox().letGo([kept.id]) : setSure(true))}
        />
      </View>
    </View>
  );
}

const styles = StyleSheet.create({
  list: { maxHeight: 320 },
  items: { gap: space.m },
  item: { gap: space.xs },
  buttons: { flexDirection: 'row', flexWrap: 'wrap', gap: space.s },
});
