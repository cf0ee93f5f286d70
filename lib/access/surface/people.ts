import type { Surface } from '../surface';

const people = 'app/(people)/administration/people/actions.ts';
const stations = 'app/(people)/administration/stations/actions.ts';
const printers = 'app/(people)/administration/printers/actions.ts';

export const peopleSurface: Surface = {
  pages: {
    /** Sends an enrolled browser to its bench and a person to their start page. */
    '/': 'bench',
    '/sign-in': 'public',
    '/not-allowed': 'public',
    /** A link's token is the authority; the page tells when it no longer works. */
    '/first-administrator/[token]': 'public',
    '/choose-password/[token]': 'public',
    '/administration': 'manage-accounts',
    '/administration/people': 'manage-accounts',
    '/administration/people/new': 'manage-accounts',
    '/administration/people/[id]': 'manage-accounts',
    '/administration/people/[id]/badge': 'manage-accounts',
    '/administration/stations': 'manage-stations',
    '/administration/stations/new': 'manage-stations',
    '/administration/stations/[code]': 'manage-stations',
    '/administration/stations/[code]/bin': 'manage-stations',
    '/administration/printers': 'manage-printers',
  },
  handlers: {
    'GET /api/auth/[...nextauth]': 'public',
    'POST /api/auth/[...nextauth]': 'public',
    /** Says only whether the asking browser is signed in. */
    'GET /api/session': 'public',
  },
  actions: {
    'app/(people)/first-administrator/[token]/actions.ts#makeFirstAdministratorAction': 'public',
    'app/(people)/choose-password/[token]/actions.ts#choosePasswordAction': 'public',
    [`${people}#addPersonAction`]: 'manage-accounts',
    [`${people}#changePersonAction`]: 'manage-accounts',
    [`${people}#setPinAction`]: 'manage-accounts',
    [`${people}#makePasswordLinkAction`]: 'manage-accounts',
    [`${people}#disablePersonAction`]: 'manage-accounts',
    [`${people}#enablePersonAction`]: 'manage-accounts',
    [`${stations}#addStationAction`]: 'manage-stations',
    [`${stations}#changeStationAction`]: 'manage-stations',
    [`${stations}#retireStationAction`]: 'manage-stations',
    [`${stations}#returnStationAction`]: 'manage-stations',
    [`${stations}#enrolBrowserAction`]: 'manage-stations',
    [`${stations}#revokeBrowsersAction`]: 'manage-stations',
    [`${printers}#savePrinterAction`]: 'manage-printers',
    [`${printers}#retirePrinterAction`]: 'manage-printers',
  },
  events: {},
};
