import type { PanelVersionReply } from '@contract';

/** Columns of a panel that can stand beside capex and book equity. */
export function furtherColumns({ columns }: Pick<PanelVersionReply, 'columns'>): string[] {
  return columns.filter(({ role }) => role === 'other').map(({ name }) => name);
}
