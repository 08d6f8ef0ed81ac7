import type { Role } from './roles';

export interface ApiRoute {
  readonly method: 'GET' | 'POST' | 'PUT' | 'DELETE';
  /** Express path with `:parameters`. */
  readonly path: string;
  /** `anyone` without signing in, `member` with any role, or the roles that may call it. */
  readonly allow: 'anyone' | 'member' | readonly Role[];
}

const model: readonly Role[] = ['analyst', 'cfo'];
const editions: readonly Role[] = ['analyst', 'cfo', 'reader'];

/**
 * Every route of the API and who may call it: the server registers routes from this table, the client builds its
 * addresses from it, and a spec walks it for every role.
 */
export const apiRoutes = {
  readSession: { method: 'GET', path: '/api/session', allow: 'anyone' },
  signIn: { method: 'POST', path: '/api/session', allow: 'anyone' },
  signOut: { method: 'DELETE', path: '/api/session', allow: 'member' },
  signUp: { method: 'POST', path: '/api/accounts', allow: 'anyone' },
  changePreferences: { method: 'PUT', path: '/api/preferences', allow: 'member' },
  viewInvitation: { method: 'POST', path: '/api/invitations/view', allow: 'anyone' },
  acceptInvitation: { method: 'POST', path: '/api/invitations/accept', allow: 'anyone' },

  listMembers: { method: 'GET', path: '/api/members', allow: ['billing_admin'] },
  inviteMember: { method: 'POST', path: '/api/members/invitations', allow: ['billing_admin'] },
  withdrawInvitation: {
    method: 'DELETE',
    path: '/api/members/invitations/:invitationId',
    allow: ['billing_admin'],
  },
  changeRoles: { method: 'PUT', path: '/api/members/:personId/roles', allow: ['billing_admin'] },
  removeMember: { method: 'DELETE', path: '/api/members/:personId', allow: ['billing_admin'] },
  readSeats: { method: 'GET', path: '/api/seats', allow: ['billing_admin'] },

  readDesk: { method: 'GET', path: '/api/desk', allow: model },

  uploadFile: { method: 'POST', path: '/api/imports', allow: ['analyst'] },
  useSample: { method: 'POST', path: '/api/imports/sample', allow: ['analyst'] },
  listImports: { method: 'GET', path: '/api/imports', allow: ['analyst'] },
  readImport: { method: 'GET', path: '/api/imports/:importId', allow: ['analyst'] },
  readImportAs: { method: 'PUT', path: '/api/imports/:importId/reading', allow: ['analyst'] },
  checkImport: { method: 'PUT', path: '/api/imports/:importId/mapping', allow: ['analyst'] },
  commitImport: { method: 'POST', path: '/api/imports/:importId/commit', allow: ['analyst'] },
  cancelCommit: { method: 'DELETE', path: '/api/imports/:importId/commit', allow: ['analyst'] },
  discardImport: { method: 'DELETE', path: '/api/imports/:importId', allow: ['analyst'] },
  listPanelVersions: { method: 'GET', path: '/api/panel-versions', allow: model },
  readPanelVersion: { method: 'GET', path: '/api/panel-versions/:panelVersionId', allow: model },
  readPanelCompanies: {
    method: 'GET',
    path: '/api/panel-versions/:panelVersionId/companies',
    allow: model,
  },
  readPanelDifferences: {
    method: 'GET',
    path: '/api/panel-versions/:panelVersionId/differences/:otherId',
    allow: model,
  },
  readCellHistory: {
    method: 'GET',
    path: '/api/panel-versions/:panelVersionId/cell-history',
    allow: model,
  },
  saveCorrections: {
    method: 'POST',
    path: '/api/panel-versions/:panelVersionId/corrections',
    allow: ['analyst'],
  },
  restorePanelVersion: {
    method: 'POST',
    path: '/api/panel-versions/:panelVersionId/restore',
    allow: ['analyst'],
  },
  exportPanelVersion: {
    method: 'GET',
    path: '/api/panel-versions/:panelVersionId/export/:format',
    allow: model,
  },
  downloadTemplate: { method: 'GET', path: '/api/panel-template/:format', allow: ['analyst'] },
  listFlagDismissals: {
    method: 'GET',
    path: '/api/panels/:panelId/flag-dismissals',
    allow: model,
  },
  dismissFlag: {
    method: 'POST',
    path: '/api/panels/:panelId/flag-dismissals',
    allow: ['analyst'],
  },
  takeBackDismissal: {
    method: 'DELETE',
    path: '/api/panels/:panelId/flag-dismissals/:dismissalId',
    allow: ['analyst'],
  },
  downloadFile: { method: 'GET', path: '/api/files/:fileId', allow: model },
  makeTableFile: { method: 'POST', path: '/api/tables/:format', allow: 'member' },

  listPeerGroups: { method: 'GET', path: '/api/peer-groups', allow: model },
  savePeerGroup: { method: 'POST', path: '/api/peer-groups', allow: ['analyst'] },
  readPeerGroup: { method: 'GET', path: '/api/peer-groups/:peerGroupId', allow: model },

  startPeerTrial: { method: 'POST', path: '/api/peer-trials', allow: ['analyst'] },
  readPeerTrial: { method: 'GET', path: '/api/peer-trials/:peerTrialId', allow: ['analyst'] },
  cancelPeerTrial: { method: 'DELETE', path: '/api/peer-trials/:peerTrialId', allow: ['analyst'] },

  listFits: { method: 'GET', path: '/api/fits', allow: model },
  startFit: { method: 'POST', path: '/api/fits', allow: ['analyst'] },
  readFit: { method: 'GET', path: '/api/fits/:fitId', allow: model },
  cancelFit: { method: 'DELETE', path: '/api/fits/:fitId', allow: ['analyst'] },
  readEvidence: { method: 'GET', path: '/api/fits/:fitId/evidence', allow: model },
  readEvidenceState: { method: 'GET', path: '/api/fits/:fitId/evidence/state', allow: model },
  startBootstrap: { method: 'POST', path: '/api/fits/:fitId/bootstrap', allow: ['analyst'] },
  cancelBootstrap: { method: 'DELETE', path: '/api/fits/:fitId/bootstrap', allow: ['analyst'] },
  downloadReplication: { method: 'GET', path: '/api/fits/:fitId/replication', allow: model },
  readLineage: { method: 'GET', path: '/api/fits/:fitId/lineage/:figure', allow: model },

  listScenarios: { method: 'GET', path: '/api/fits/:fitId/scenarios', allow: model },
  readDraft: { method: 'GET', path: '/api/fits/:fitId/draft', allow: ['analyst'] },
  saveDraft: { method: 'PUT', path: '/api/fits/:fitId/draft', allow: ['analyst'] },
  discardDraft: { method: 'DELETE', path: '/api/fits/:fitId/draft', allow: ['analyst'] },
  saveScenario: { method: 'POST', path: '/api/scenarios', allow: ['analyst'] },
  readScenario: { method: 'GET', path: '/api/scenarios/:scenarioId', allow: model },
  changeScenario: { method: 'PUT', path: '/api/scenarios/:scenarioId', allow: ['analyst'] },
  deleteScenario: { method: 'DELETE', path: '/api/scenarios/:scenarioId', allow: ['analyst'] },
  restoreScenario: {
    method: 'POST',
    path: '/api/scenarios/:scenarioId/restore',
    allow: ['analyst'],
  },
  listScenarioVersions: {
    method: 'GET',
    path: '/api/scenarios/:scenarioId/versions',
    allow: model,
  },
  copyScenario: { method: 'POST', path: '/api/scenarios/:scenarioId/copy', allow: ['analyst'] },

  listEditions: { method: 'GET', path: '/api/editions', allow: editions },
  readEditionHistory: { method: 'GET', path: '/api/editions/history', allow: editions },
  previewEdition: { method: 'POST', path: '/api/editions/preview', allow: ['analyst'] },
  publishEdition: { method: 'POST', path: '/api/editions', allow: ['analyst'] },
  readEdition: { method: 'GET', path: '/api/editions/:editionId', allow: editions },
  readEditionLineage: {
    method: 'GET',
    path: '/api/editions/:editionId/lineage/:figure',
    allow: editions,
  },
  verifyEdition: { method: 'GET', path: '/api/editions/:editionId/verification', allow: editions },
  exportEdition: {
    method: 'GET',
    path: '/api/editions/:editionId/export/:format',
    allow: editions,
  },
  openWarning: {
    method: 'PUT',
    path: '/api/editions/:editionId/warnings/:warningId',
    allow: ['cfo'],
  },
  commentEdition: {
    method: 'POST',
    path: '/api/editions/:editionId/comments',
    allow: model,
  },
  signEdition: { method: 'POST', path: '/api/editions/:editionId/sign', allow: ['cfo'] },
  returnEdition: { method: 'POST', path: '/api/editions/:editionId/return', allow: ['cfo'] },
} as const satisfies Record<string, ApiRoute>;

export type ApiRouteName = keyof typeof apiRoutes;

export interface Page {
  readonly path: string;
  readonly label: string;
  readonly allow: readonly Role[];
}

/** The pages of the rail, in the order of the work, and who sees them. */
export const pages = [
  { path: 'panel', label: 'Panel', allow: model },
  { path: 'peers', label: 'Peers', allow: model },
  { path: 'fit', label: 'Fit', allow: model },
  { path: 'scenarios', label: 'Scenarios', allow: model },
  { path: 'board', label: 'Board', allow: editions },
  { path: 'seats', label: 'Seats', allow: ['billing_admin'] },
  { path: 'members', label: 'Members', allow: ['billing_admin'] },
] as const satisfies readonly Page[];

export function mayCall(route: ApiRoute, held: readonly Role[]): boolean {
  return typeof route.allow === 'string' || route.allow.some((role) => held.includes(role));
}

export function maySee(page: Page, held: readonly Role[]): boolean {
  return page.allow.some((role) => held.includes(role));
}

/** Where a person lands after signing in: the CFO and readers on the board, the billing admin on the seats. */
export function landingPath(held: readonly Role[]): string {
  if (held.includes('cfo') || (held.includes('reader') && !held.includes('analyst')))
    return '/board';
  return held.includes('analyst') ? '/panel' : '/seats';
}
