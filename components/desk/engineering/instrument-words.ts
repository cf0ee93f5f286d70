import type { InstrumentKind } from '@/lib/contracts/stored-states';

export const instrumentWords: Record<InstrumentKind, string> = {
  supply: 'Supply',
  multimeter: 'Multimeter',
  'fixture-controller': 'Fixture controller',
};
/** The station's own part, which no certificate limits. */
export const needsCertificate = (kind: InstrumentKind) => kind !== 'fixture-controller';
