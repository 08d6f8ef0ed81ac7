import { writeFileSync } from 'node:fs';
import { demoPanelCsv } from './demo-panel';

/** Writes the sample panel that an empty workspace can open. */
writeFileSync(new URL('../backend/panels/sample-panel.csv', import.meta.url), demoPanelCsv());
