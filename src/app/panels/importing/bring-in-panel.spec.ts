import { HttpEventType, provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { Router, provideRouter } from '@angular/router';
import { problemType } from '@contract';
import { BringInPanel } from './bring-in-panel';
import { flowDraft } from './testing/import-replies';

describe('bringing in a file', () => {
  function begin(): {
    readonly http: HttpTestingController;
    readonly words: () => string;
    readonly drop: (file: File) => Promise<void>;
    readonly settled: () => Promise<void>;
  } {
    TestBed.configureTestingModule({
      providers: [
        provideHttpClient(),
        provideHttpClientTesting(),
        provideRouter([{ path: '**', children: [] }]),
      ],
    });
    const fixture = TestBed.createComponent(BringInPanel);
    const host = fixture.nativeElement as HTMLElement;
    const settled = async (): Promise<void> => {
      await new Promise((resolve) => setTimeout(resolve));
      await fixture.whenStable();
    };
    return {
      http: TestBed.inject(HttpTestingController),
      words: () => (host.textContent ?? '').replace(/\s+/g, ' '),
      settled,
      drop: async (file) => {
        await settled();
        const dataTransfer = new DataTransfer();
        dataTransfer.items.add(file);
        host.querySelector('kv-file-drop')?.dispatchEvent(new DragEvent('drop', { dataTransfer }));
        await settled();
      },
    };
  }

  it('says how much of a workbook is sent, and leads to its import', async () => {
    const { http, words, drop, settled } = begin();
    await drop(new File(['x'], 'peers.xlsx'));
    const sent = http.expectOne({ method: 'POST', url: '/api/imports' });
    sent.event({ type: HttpEventType.UploadProgress, loaded: 3, total: 10 });
    await settled();
    expect(words()).toContain('Sending peers.xlsx: 30 of 100');
    sent.event({ type: HttpEventType.UploadProgress, loaded: 10, total: 10 });
    await settled();
    expect(words()).toContain('Reading peers.xlsx…');
    sent.flush(flowDraft);
    await settled();
    expect(TestBed.inject(Router).url).toBe(`/panel/import/${flowDraft.id}`);
  });

  it('does not send a file of another kind', async () => {
    const { http, words, drop } = begin();
    await drop(new File(['x'], 'peers.pdf'));
    http.expectNone('/api/imports');
    expect(words()).toContain('found peers.pdf');
  });

  it('says what to do about a workbook that is refused', async () => {
    const { http, words, drop, settled } = begin();
    await drop(new File(['x'], 'peers.xlsx'));
    http.expectOne('/api/imports').flush(
      {
        type: problemType('unreadable-file'),
        title: 'The file cannot be read',
        status: 422,
        code: 'zip_limit',
        detail: 'expected at most 200 MB of unpacked sheets',
      },
      { status: 422, statusText: 'Unprocessable Content' },
    );
    await settled();
    expect(words()).toContain('Expected at most 200 MB of unpacked sheets.');
    expect(words()).toContain('Save the one sheet that is needed');
  });
});
