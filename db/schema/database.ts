import type {
  ActivityTable,
  BillingAccountTable,
  InvitationTable,
  MembershipTable,
  PersonTable,
  SignInThrottleTable,
  WorkspaceTable,
} from './accounts-tables';
import type {
  EditionAccessTable,
  EditionCommentTable,
  EditionTable,
  EditionWarningOpenedTable,
} from './edition-table';
import type { FitBootstrapTable, FitEvidenceTable, FitTable, JobTicketTable } from './fit-tables';
import type { MailDueTable, MailTable } from './mail-table';
import type {
  FlagDismissalTable,
  ImportDraftTable,
  PanelCompanyTable,
  PanelCorrectionTable,
  PanelRowTable,
  PanelTable,
  PanelVersionTable,
  StoredFileTable,
} from './panel-tables';
import type { PeerChoiceTable, PeerGroupVersionTable } from './peer-tables';
import type { ScenarioDraftTable, ScenarioTable, ScenarioVersionTable } from './scenario-tables';
import type { PeerTrialTable, TrialFitTable } from './trial-tables';

/** Tables by name; the session and queue tables belong to their packages. */
export interface Database {
  activity: ActivityTable;
  billingAccount: BillingAccountTable;
  edition: EditionTable;
  editionAccess: EditionAccessTable;
  editionComment: EditionCommentTable;
  editionWarningOpened: EditionWarningOpenedTable;
  fit: FitTable;
  fitBootstrap: FitBootstrapTable;
  fitEvidence: FitEvidenceTable;
  flagDismissal: FlagDismissalTable;
  importDraft: ImportDraftTable;
  invitation: InvitationTable;
  jobTicket: JobTicketTable;
  mail: MailTable;
  mailDue: MailDueTable;
  membership: MembershipTable;
  panel: PanelTable;
  panelCompany: PanelCompanyTable;
  panelCorrection: PanelCorrectionTable;
  panelRow: PanelRowTable;
  panelVersion: PanelVersionTable;
  peerChoice: PeerChoiceTable;
  peerGroupVersion: PeerGroupVersionTable;
  peerTrial: PeerTrialTable;
  person: PersonTable;
  scenario: ScenarioTable;
  scenarioDraft: ScenarioDraftTable;
  scenarioVersion: ScenarioVersionTable;
  signInThrottle: SignInThrottleTable;
  storedFile: StoredFileTable;
  trialFit: TrialFitTable;
  workspace: WorkspaceTable;
}
