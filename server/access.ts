import type { AccessTable } from './platform/http.ts';

const OWNER = ['owner'] as const;
const BOOKS = ['owner', 'bookkeeper'] as const;
const READS_BOOKS = ['owner', 'bookkeeper', 'accountant'] as const;
const WORKS = ['owner', 'bookkeeper', 'mechanic'] as const;
const SHOP = ['owner', 'bookkeeper', 'mechanic', 'partner', 'accountant'] as const;

/**
 * Who may call what: the one table that routes, the API document and the tests are made from. A route that does
 * not stand here stops the start; so does a line without a route. The rule is to refuse.
 */
export const access: AccessTable = {
  'GET /api/health': 'everyone',
  'GET /api/openapi.json': 'everyone',

  'GET /api/session': 'everyone',
  'POST /api/session': 'everyone',
  'DELETE /api/session': 'everyone',
  'POST /api/sign-up': 'everyone',
  'PUT /api/session/shop': 'signed in',

  'GET /api/people': OWNER,
  'PATCH /api/people/:userId': OWNER,
  'DELETE /api/people/:userId': OWNER,
  'POST /api/people/invitations': OWNER,
  'DELETE /api/people/invitations/:invitationId': OWNER,
  'POST /api/join/look': 'everyone',
  'POST /api/join': 'everyone',

  'GET /api/shop': READS_BOOKS,
  'PATCH /api/shop': OWNER,
  'GET /api/shop/lists': SHOP,
  'POST /api/shop/lists/:kind': OWNER,
  'PATCH /api/shop/lists/:kind/:itemId': OWNER,
  'POST /api/shop/workers': BOOKS,
  'PATCH /api/shop/workers/:workerId': BOOKS,

  'GET /api/rebuilds': READS_BOOKS,
  'GET /api/rebuilds/names': READS_BOOKS,
  'GET /api/rebuilds/:rebuildId': READS_BOOKS,
  'POST /api/rebuilds': BOOKS,
  'PATCH /api/rebuilds/:rebuildId': BOOKS,
  'POST /api/rebuilds/:rebuildId/estimates': BOOKS,
  'PATCH /api/rebuilds/:rebuildId/estimates/:estimateId': BOOKS,
  'POST /api/rebuilds/:rebuildId/estimates/:estimateId/lock': BOOKS,

  'GET /api/entries': READS_BOOKS,
  'GET /api/entries/:entryId': READS_BOOKS,
  'POST /api/entries': BOOKS,
  'POST /api/entries/split': BOOKS,
  'PATCH /api/entries/:entryId': BOOKS,
  'POST /api/entries/:entryId/void': BOOKS,
  'POST /api/receipts': WORKS,

  'GET /api/hours': READS_BOOKS,
  'POST /api/hours': BOOKS,
  'PATCH /api/hours/:hoursId': BOOKS,
  'POST /api/hours/:hoursId/void': BOOKS,
  'GET /api/board': WORKS,
  'GET /api/my-hours': WORKS,
  'POST /api/my-hours': WORKS,
  'PATCH /api/my-hours/:hoursId': WORKS,
  'POST /api/my-hours/:hoursId/void': WORKS,

  'GET /api/imports': READS_BOOKS,
  'POST /api/imports': BOOKS,
  'GET /api/imports/:importId': READS_BOOKS,
  'PATCH /api/imports/:importId': BOOKS,
  'DELETE /api/imports/:importId': BOOKS,
  'GET /api/imports/:importId/rows': READS_BOOKS,
  'GET /api/imports/:importId/progress': READS_BOOKS,
  'POST /api/imports/:importId/commit': BOOKS,
  'POST /api/imports/:importId/undo': BOOKS,

  'GET /api/answers/year': READS_BOOKS,
  'GET /api/answers/what-pays': READS_BOOKS,
  'GET /api/answers/overruns': READS_BOOKS,
  'GET /api/answers/time-to-sell': READS_BOOKS,
  'GET /api/answers/contingency': READS_BOOKS,
  'GET /api/answers/rule-for-car': READS_BOOKS,
  'GET /api/answers/rule-review': READS_BOOKS,
  'GET /api/checks': READS_BOOKS,
  'PUT /api/checks/settled': BOOKS,
  'GET /api/rules': READS_BOOKS,
  'POST /api/rules': BOOKS,

  'GET /api/bids/basis': READS_BOOKS,
  'GET /api/fee-table': READS_BOOKS,
  'PUT /api/fee-table': OWNER,
  'GET /api/bids': READS_BOOKS,
  'GET /api/bids/:bidId': READS_BOOKS,
  'POST /api/bids': BOOKS,
  'PATCH /api/bids/:bidId': BOOKS,
  'POST /api/bids/:bidId/outcome': BOOKS,
  'POST /api/bids/:bidId/buy': BOOKS,
};
