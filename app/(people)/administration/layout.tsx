import type { ReactNode } from 'react';
import { DeskFrame } from '../../desk-frame';

export default function AdministrationLayout({ children }: { children: ReactNode }) {
  return <DeskFrame>{children}</DeskFrame>;
}
