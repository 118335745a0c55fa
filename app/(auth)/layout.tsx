import type { ReactNode } from 'react';
import { BarePage } from '@/components/shell/bare-page';
import { LanguageSwitch } from '@/components/shell/language-switch';

/** Sign-in and its neighbours. */
export default function AuthLayout({ children }: { children: ReactNode }) {
  return <BarePage aside={<LanguageSwitch />}>{children}</BarePage>;
}
