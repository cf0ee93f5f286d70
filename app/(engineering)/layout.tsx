import type { ReactNode } from 'react';
import { DeskFrame } from '../desk-frame';

export default function EngineeringLayout({ children }: { children: ReactNode }) {
  return <DeskFrame>{children}</DeskFrame>;
}
