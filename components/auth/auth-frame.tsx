import type { ReactNode } from 'react';
import { Brand } from '@/components/shell/brand';
import { Screen } from '@/components/ui/screen';

/** The frame of the screens before the door: the brand, a narrow column, the button at its end. */
export function AuthFrame({ title, children }: { title: string; children: ReactNode }) {
  return (
    <Screen title={title} large brand={<Brand />} withoutRail maxWidth={520}>
      {children}
    </Screen>
  );
}
