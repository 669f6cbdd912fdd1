import { useId, type ReactNode } from 'react';
import { Modal, StyleSheet, View } from 'react-native';
import { Body, Heading } from '@/components/ui/text';
import { radius, space } from '@/constants/theme';
import { useTokens } from '@/hooks/use-tokens';

interface SheetProps {
  title: string;
  children?: string;
  /** Buttons, the safe one last. */
  actions: ReactNode;
  /** Escape, or a press beside the sheet. */
  onClose: () => void;
}

/** A question at the bottom of the screen, under the thumb. It keeps the keyboard inside itself until it is answered. */
export function Sheet({ title, children, actions, onClose }: SheetProps) {
  const tokens = useTokens();
  const id = useId();
  // The web's own attributes, which react-native's Modal does not know: the dialog is named by its heading.
  const named = { 'aria-labelledby': id };
  // A press beside the sheet closes it; no button, because Tab has nothing to do there.
  const beside = { onClick: onClose };
  return (
    <Modal {...named} visible transparent animationType="none" onRequestClose={onClose}>
      <View style={styles.over}>
        <View {...beside} aria-hidden style={[styles.behind, { backgroundColor: tokens.ink }]} />
        <View style={[styles.sheet, { backgroundColor: tokens.paper, borderColor: tokens.ink }]}>
          <Heading id={id} level={2} size="head">
            {title}
          </Heading>
          {children ? <Body>{children}</Body> : null}
          <View style={styles.actions}>{actions}</View>
        </View>
      </View>
    </Modal>
  );
}

const styles = StyleSheet.create({
  over: { flex: 1, justifyContent: 'flex-end', alignItems: 'center' },
  behind: { position: 'absolute', inset: 0, opacity: 0.45 },
  // Over what lies behind it, which stands out of the flow.
  sheet: {
    zIndex: 1,
    width: '100%',
    maxWidth: 560,
    maxHeight: '90%',
    borderTopWidth: 2,
    borderTopLeftRadius: radius.verdict,
    borderTopRightRadius: radius.verdict,
    padding: space.l,
    gap: space.m,
  },
  actions: { gap: space.s },
});
