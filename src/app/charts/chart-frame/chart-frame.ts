import {
  ChangeDetectionStrategy,
  Component,
  DestroyRef,
  Directive,
  ElementRef,
  Injector,
  afterNextRender,
  computed,
  contentChild,
  forwardRef,
  inject,
  input,
  model,
  signal,
} from '@angular/core';
import { firstValueFrom } from 'rxjs';
import { ApiProblem } from '../../api/api-problem';
import { type TableFormat, TablesApi } from '../../api/tables-api';
import type { ChartColumn, ChartRow, ChartText } from '../chart-text';
import { chartTable } from './chart-table';
import { fileNameOf, pngFile, saveFile, svgFile } from './picture-files';
import { standalonePicture } from './standalone-picture';

/**
 * What every chart has around it: the same values as a table, export as SVG, PNG, CSV and XLSX, a summary for screen
 * readers, and its width as the container gives it. The chart is the projected `<svg [kvPicture]>`; a heading, where the page
 * shows none, goes into `[chartHeading]`.
 */
@Component({
  selector: 'kv-chart-frame',
  templateUrl: './chart-frame.html',
  styleUrl: './chart-frame.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ChartFrame {
  readonly #host = inject<ElementRef<HTMLElement>>(ElementRef);
  readonly #injector = inject(Injector);

  readonly text = input.required<ChartText>();
  /** One or two sentences that say what the chart shows. */
  readonly summary = input.required<string>();
  readonly columns = input.required<readonly ChartColumn[]>();
  readonly rows = input.required<readonly ChartRow[]>();
  /** What the page says beside the chart and an export has to say itself, above the source. */
  readonly note = input('');
  /** Width of the container in CSS pixels, for the layout. */
  readonly width = model(640);

  readonly picture = contentChild.required<ChartPicture, ElementRef<SVGSVGElement>>(
    forwardRef(() => ChartPicture),
    { read: ElementRef },
  );

  protected readonly isTable = signal(false);
  protected readonly trouble = signal('');

  constructor() {
    const observer = new ResizeObserver(() => this.#measure());
    afterNextRender({
      read: () => {
        this.#measure();
        observer.observe(this.#host.nativeElement);
      },
    });
    inject(DestroyRef).onDestroy(() => observer.disconnect());
  }

  protected toggle(): void {
    this.isTable.update((isTable) => !isTable);
  }

  protected async saveSvg(): Promise<void> {
    await this.#save(async () => svgFile(this.#picture()), 'svg');
  }

  protected async savePng(): Promise<void> {
    await this.#save(async () => pngFile(this.#picture()), 'png');
  }

  protected async saveTable(format: TableFormat): Promise<void> {
    const table = chartTable(this.text(), this.columns(), this.rows(), this.note());
    // Asked for only here: a chart that is looked at needs no server.
    const tables = this.#injector.get(TablesApi);
    await this.#save(() => firstValueFrom(tables.fileOf(table, format)), format);
  }

  #measure(): void {
    const width = Math.floor(this.#host.nativeElement.getBoundingClientRect().width);
    if (width > 0) this.width.set(width); // 0 while it is hidden
  }

  #picture(): SVGSVGElement {
    const source = [this.note(), this.text().source].filter((part) => part !== '').join(' ');
    return standalonePicture(this.picture().nativeElement, { ...this.text(), source });
  }

  async #save(make: () => Promise<Blob>, ending: string): Promise<void> {
    this.trouble.set('');
    try {
      saveFile(await make(), fileNameOf(this.text().title, ending));
    } catch (error) {
      // Fonts that did not load, a canvas the browser refuses, a server that does not answer: the person can act on
      // it, so it is said here.
      const found = wordsOf(error);
      this.trouble.set(`The ${ending.toUpperCase()} file could not be made: ${found}. Try again.`);
    }
  }
}

function wordsOf(error: unknown): string {
  if (error instanceof ApiProblem) return error.problem.title;
  return error instanceof Error ? error.message : String(error);
}

/** The drawing inside a chart's frame: as large as its layout, and called by the chart's title. */
@Directive({
  selector: 'svg[kvPicture]',
  host: {
    '[attr.aria-label]': 'frame.text().title',
    '[attr.width]': 'size().width',
    '[attr.height]': 'size().height',
    '[attr.viewBox]': 'viewBox()',
  },
})
export class ChartPicture {
  protected readonly frame = inject(ChartFrame);

  /** In CSS pixels. */
  readonly size = input.required<{ readonly width: number; readonly height: number }>({
    alias: 'kvPicture',
  });

  protected readonly viewBox = computed(() => `0 0 ${this.size().width} ${this.size().height}`);
}
