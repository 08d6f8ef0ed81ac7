import { type ChildProcessWithoutNullStreams, spawn } from 'node:child_process';
import { once } from 'node:events';
import { writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { createInterface, type Interface } from 'node:readline';
import type { PanelColumns } from '../../backend/stats';

/** R's panel package over one panel, in a process of its own that has read the data and waits to be asked. */
export class OutsideFit {
  private constructor(
    private readonly child: ChildProcessWithoutNullStreams,
    private readonly lines: Interface,
  ) {}

  /** Null where R or plm is not installed. */
  static async open(
    data: PanelColumns,
    { folder, scripts }: { readonly folder: string; readonly scripts: string },
  ): Promise<OutsideFit | null> {
    const columns = [data.outcome.values, ...data.regressors.map(({ values }) => values)];
    const doubles = [Float64Array.from(data.company), Float64Array.from(data.year), ...columns];
    const path = join(folder, 'panel.bin');
    writeFileSync(path, Buffer.concat(doubles.map(({ buffer }) => Buffer.from(buffer))));
    const rows = String(data.company.length);
    const child = spawn('Rscript', [join(scripts, 'plm-time.R'), path, rows]);
    const lines = createInterface(child.stdout);
    const ready = once(lines, 'line').then(() => true);
    const absent = Promise.race([once(child, 'exit'), once(child, 'error')]).then(() => false);
    const isReady = await Promise.race([ready, absent]).catch(() => false);
    return isReady ? new OutsideFit(child, lines) : null;
  }

  /**
   * Milliseconds of one run as R measures them: plm's within fit, its classical and company-clustered covariance and its
   * fixed effects.
   */
  async time(): Promise<number> {
    this.child.stdin.write('\n');
    const [line] = (await once(this.lines, 'line')) as [string];
    return Number(line);
  }

  close(): void {
    this.child.stdin.end();
  }
}
