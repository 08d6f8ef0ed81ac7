export type { FileFinding as TableFinding } from '../parse-messages';
