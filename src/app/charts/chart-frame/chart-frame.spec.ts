import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { ChangeDetectionStrategy, Component, signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { ChartFrame, ChartPicture } from './chart-frame';
import { fileNameOf, pngFile, svgFile } from './picture-files';
import { standalonePicture } from './standalone-picture';

const text = {
  title: 'Velmara stands 2,100 (700 to 3,400) above its peers',
  caption: 'EUR m, FY2008–FY2025',
  source: 'Panel v4, fit 6f3a91',
};

@Component({
  selector: 'kv-framed',
  imports: [ChartFrame, ChartPicture],
  template: `
    <kv-chart-frame [text]="text" summary="Two marks." [columns]="[]" [rows]="[]" [(width)]="width">
      <svg [kvPicture]="{ width: width(), height: 40 }">
        <rect class="own" width="10" height="10" role="img" aria-label="own" />
        <circle class="ring" data-screen-only r="4" />
        <g data-follows-scroll transform="translate(0,300)"><text>2025</text></g>
      </svg>
    </kv-chart-frame>
  `,
  styles: `
    .own {
      fill: var(--kv-copper);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
class Framed {
  protected readonly text = text;
  readonly width = signal(640);
}

describe('chart frame', () => {
  async function shown(hostWidth = 500) {
    const fixture = TestBed.createComponent(Framed);
    const page = fixture.nativeElement as HTMLElement;
    page.style.display = 'block';
    page.style.width = `${hostWidth}px`;
    await fixture.whenStable();
    return { fixture, page, svg: page.querySelector('svg')! };
  }

  afterEach(() => document.documentElement.removeAttribute('data-theme'));

  it('hands the width of its container to the chart', async () => {
    const { fixture } = await shown(432);
    expect(fixture.componentInstance.width()).toBe(432);
  });

  it('sums the chart up for those who cannot see it, under its title', async () => {
    const { page } = await shown();
    expect(page.querySelector('figure')?.getAttribute('aria-label')).toBe(text.title);
    expect(page.querySelector('p.kv-visually-hidden')?.textContent).toBe('Two marks.');
  });

  it('calls its picture by the title, and makes it as large as the layout', async () => {
    const { svg } = await shown(432);
    const named = ['aria-label', 'width', 'height', 'viewBox'].map((name) =>
      svg.getAttribute(name),
    );
    expect(named).toEqual([text.title, '432', '40', '0 0 432 40']);
  });

  it('writes title, unit and source into a picture that needs no style sheet', async () => {
    const { svg } = await shown();
    const picture = standalonePicture(svg, text);
    const words = [...picture.querySelectorAll('text')].map((word) => word.textContent);
    expect(words).toEqual([text.title, text.caption, '2025', text.source]);
    expect(picture.querySelector('[class], [style], [role], [data-screen-only]')).toBeNull();
    expect(picture.querySelector('[transform]')).toBeNull();
    expect(picture.querySelector('circle')).toBeNull();
  });

  it('draws the picture in light colours, whatever the screen shows', async () => {
    const { svg } = await shown();
    const fillIn = (theme: string) => {
      document.documentElement.setAttribute('data-theme', theme);
      return standalonePicture(svg, text).querySelector('rect[width="10"]')?.getAttribute('fill');
    };
    const light = fillIn('light');
    expect(light).toMatch(/^rgb\(/);
    expect(fillIn('dark')).toBe(light);
    expect(svg.style.colorScheme).toBe('');
  });

  it('makes an SVG that parses and a PNG twice its size', async () => {
    const { svg } = await shown(400);
    const picture = standalonePicture(svg, text);
    const parsed = new DOMParser().parseFromString(
      await (await svgFile(picture)).text(),
      'image/svg+xml',
    );
    expect(parsed.querySelector('parsererror')).toBeNull();
    expect(parsed.documentElement.getAttribute('width')).toBe('448');
    const bitmap = await createImageBitmap(await pngFile(picture));
    expect(bitmap.width).toBe(896);
  });

  describe('exported as a table', () => {
    beforeEach(() => {
      TestBed.configureTestingModule({
        providers: [provideHttpClient(), provideHttpClientTesting()],
      });
    });

    it('asks the server for the file and hands it on under the title', async () => {
      const saved: string[] = [];
      spyOn(HTMLAnchorElement.prototype, 'click').and.callFake(function (this: HTMLAnchorElement) {
        saved.push(this.download);
      });
      const { fixture, page } = await shown();
      const http = TestBed.inject(HttpTestingController);
      for (const format of ['CSV', 'XLSX']) {
        page.querySelector<HTMLElement>(`[aria-label="Export as ${format}"]`)?.click();
        await fixture.whenStable();
        const sent = http.expectOne(`/api/tables/${format.toLowerCase()}`);
        expect(sent.request.method).toBe('POST');
        expect((sent.request.body as { name: string }).name).toBe(text.title);
        sent.flush(new ArrayBuffer(3));
        await fixture.whenStable();
      }
      const name = 'velmara-stands-2-100-700-to-3-400-above-its-peers';
      await new Promise((resolve) => setTimeout(resolve));
      expect(saved).toEqual([`${name}.csv`, `${name}.xlsx`]);
    });

    it('says so where the server does not answer', async () => {
      const { fixture, page } = await shown();
      page.querySelector<HTMLElement>('[aria-label="Export as XLSX"]')?.click();
      await fixture.whenStable();
      TestBed.inject(HttpTestingController)
        .expectOne('/api/tables/xlsx')
        .error(new ProgressEvent('error'));
      await new Promise((resolve) => setTimeout(resolve));
      await fixture.whenStable();
      expect(page.querySelector('.trouble')?.textContent).toBe(
        'The XLSX file could not be made: The server does not answer. Try again.',
      );
    });
  });

  it('names the file after the title', () => {
    expect(fileNameOf('Zürich: 2,100 (700 to 3,400)!', 'svg')).toBe(
      'zurich-2-100-700-to-3-400.svg',
    );
    expect(fileNameOf('…', 'png')).toBe('chart.png');
  });
});
