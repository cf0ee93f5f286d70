import * as accountLinks from './schema/account-links';
import * as accounts from './schema/accounts';
import * as boardTypeRevisions from './schema/board-type-revisions';
import * as boardTypes from './schema/board-types';
import * as calibrations from './schema/calibrations';
import * as commissionings from './schema/commissionings';
import * as dailyChecks from './schema/daily-checks';
import * as dispositions from './schema/dispositions';
import * as draftEditors from './schema/draft-editors';
import * as dryRuns from './schema/dry-runs';
import * as engineeringOffers from './schema/engineering-offers';
import * as files from './schema/files';
import * as lotMoves from './schema/lot-moves';
import * as signatures from './schema/signatures';
import * as reasonCodes from './schema/reason-codes';
import * as lotHolds from './schema/lot-holds';
import * as holdRuleSets from './schema/hold-rule-sets';
import * as chartBaselines from './schema/chart-baselines';
import * as certificates from './schema/certificates';
import * as mails from './schema/mails';
import * as mailSubscriptions from './schema/mail-subscriptions';
import * as siteSettings from './schema/site-settings';
import * as apiTokens from './schema/api-tokens';
import * as webhooks from './schema/webhooks';
import * as webhookDeliveries from './schema/webhook-deliveries';
import * as trailCheckpoints from './schema/trail-checkpoints';
import * as yieldDays from './schema/yield-days';
import * as engineerCalls from './schema/engineer-calls';
import * as instruments from './schema/instruments';
import * as labels from './schema/labels';
import * as lotComponents from './schema/lot-components';
import * as lots from './schema/lots';
import * as measurements from './schema/measurements';
import * as printers from './schema/printers';
import * as referenceBoards from './schema/reference-boards';
import * as retestOrders from './schema/retest-orders';
import * as runEvents from './schema/run-events';
import * as runs from './schema/runs';
import * as sequenceRevisions from './schema/sequence-revisions';
import * as sequences from './schema/sequences';
import * as sessions from './schema/sessions';
import * as signInAttempts from './schema/sign-in-attempts';
import * as simulatedBoards from './schema/simulated-boards';
import * as stationEnrolments from './schema/station-enrolments';
import * as stations from './schema/stations';
import * as traces from './schema/traces';
import * as trail from './schema/trail';
import * as trainings from './schema/trainings';
import * as units from './schema/units';

/** Every table, enum and relation, as the query builder takes them. */
export const tables = {
  ...accountLinks,
  ...accounts,
  ...boardTypeRevisions,
  ...boardTypes,
  ...calibrations,
  ...commissionings,
  ...dailyChecks,
  ...dispositions,
  ...draftEditors,
  ...dryRuns,
  ...engineeringOffers,
  ...files,
  ...lotMoves,
  ...signatures,
  ...reasonCodes,
  ...lotHolds,
  ...holdRuleSets,
  ...chartBaselines,
  ...certificates,
  ...mails,
  ...mailSubscriptions,
  ...siteSettings,
  ...apiTokens,
  ...webhooks,
  ...webhookDeliveries,
  ...trailCheckpoints,
  ...yieldDays,
  ...engineerCalls,
  ...instruments,
  ...labels,
  ...lotComponents,
  ...lots,
  ...measurements,
  ...printers,
  ...referenceBoards,
  ...retestOrders,
  ...runEvents,
  ...runs,
  ...sequenceRevisions,
  ...sequences,
  ...sessions,
  ...signInAttempts,
  ...simulatedBoards,
  ...stationEnrolments,
  ...stations,
  ...traces,
  ...trail,
  ...trainings,
  ...units,
};
