import { rowsByCompany } from '../company-rows';
import type { ModelRole } from '../model-role';
import type { PanelCells } from '../panel-cells';

/** A panel as the rules look at it: read once, used by all. */
export interface FlagGround {
  readonly panel: PanelCells;
  /** Row numbers of each company in order of year. */
  readonly rowsOf: readonly Int32Array[];
  /** Positions of the model's columns. */
  readonly model: Readonly<Partial<Record<ModelRole, number>>>;
}

export function flagGround(panel: PanelCells): FlagGround {
  const model: Partial<Record<ModelRole, number>> = {};
  panel.columns.forEach(({ role }, column) => {
    if (role !== 'other') model[role] = column;
  });
  return { panel, rowsOf: rowsByCompany(panel), model };
}

/** Positions of the columns that the model uses, in the panel's order. */
export function modelColumns({ model }: FlagGround): readonly number[] {
  return Object.values(model).sort((left, right) => left - right);
}
