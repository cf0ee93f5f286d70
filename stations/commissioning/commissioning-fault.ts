import { StationFault } from '../run/fault-of';

/** Why a station could not be measured; the code is printed for the engineer. */
const faults = {
  notOn: ['C-331', 'The reference board does not switch on. Check that it is seated and of the right type.'],
  pointsOff: ['C-332', 'The reference board does not have its recorded points. Check it at another station.'],
  notSettling: ['C-333', 'The supply does not come to rest within the longest time tried.'],
  overshootTooLarge: ['C-334', 'The supply overshoots more than can be measured. Check its remote sense wiring.'],
  flippedEarly: [
    'C-335',
    'The reference board switched where it should not: its points are not as recorded or not steady, or the supply overshoots beyond measure.',
  ],
  noRoom: ['C-336', 'The board type leaves no room between its points and its maximum for the steps needed.'],
} as const;

export function commissioningFault(kind: keyof typeof faults): StationFault {
  const [code, detail] = faults[kind];
  return new StationFault({ reason: 'interrupted', code, detail });
}
