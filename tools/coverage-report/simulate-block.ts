import { judgeReplication } from './judge-replication';
import { mostReplications, type Setting } from './setting';
import { simulatePanel } from './simulate-panel';
import type { Tallies } from './tally';

/** A stretch of one setting's replications, from 0 on. */
export interface Block {
  readonly setting: Setting;
  readonly from: number;
  readonly to: number;
}

/** Seeds of signs lie beyond all seeds of panels: signs from the numbers that made the panel would go with it. */
const wildOffset = 1000 * mostReplications;

export function simulateBlock({ setting, from, to }: Block): Tallies {
  const tallies: Tallies = new Map();
  for (let replication = from; replication < to; replication += 1) {
    const panel = simulatePanel(setting, replication);
    const wildSeed = setting.hasWild ? wildOffset + setting.seed + replication : null;
    judgeReplication(tallies, panel, { effects: setting.effects, wildSeed });
  }
  return tallies;
}
