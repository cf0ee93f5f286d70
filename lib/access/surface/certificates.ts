import type { Surface } from '../surface';

export const certificatesSurface: Surface = {
  pages: {
    '/certificates': 'signed-in',
    /** Asks for the code on a paper. */
    '/verify': 'public',
    /** Whoever holds the paper; shows that certificate and nothing else. */
    '/verify/[token]': 'public',
  },
  handlers: { 'GET /api/certificates/[id]/pdf': 'signed-in' },
  actions: {
    'app/(quality)/certificates/actions.ts#issueCertificateAction': 'issue-certificates',
    'app/(quality)/certificates/actions.ts#revokeCertificateAction': 'issue-certificates',
  },
  events: {},
};
