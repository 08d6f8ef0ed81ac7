import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { Router, provideRouter } from '@angular/router';
import { type PeerGroupReply, shortCaution } from '@contract';
import { flowControl } from '../testing/loaded-peers';
import { doneFit, peerVersion, sized } from '../testing/peer-version';
import { PeerComparePage } from './compare-page';

const first = peerVersion(1, { Kesdrin: 'Pumps', Tolvane: 'Valves' });
const second = peerVersion(2, { Kesdrin: 'Pumps', Tolvane: 'Concessions' }, ['Tolvane']);

describe('the page of two versions', () => {
  let fixture: ComponentFixture<PeerComparePage>;
  let http: HttpTestingController;

  beforeEach(() => {
    TestBed.configureTestingModule({
      providers: [
        provideHttpClient(),
        provideHttpClientTesting(),
        provideRouter([{ path: '**', children: [] }]),
      ],
    });
    http = TestBed.inject(HttpTestingController);
  });

  afterEach(() => {
    http.verify();
  });

  async function settled(): Promise<void> {
    await new Promise((resolve) => setTimeout(resolve));
    await fixture.whenStable();
  }

  async function open(versions: readonly PeerGroupReply[], a?: string, b?: string): Promise<void> {
    fixture = TestBed.createComponent(PeerComparePage);
    fixture.componentRef.setInput('a', a);
    fixture.componentRef.setInput('b', b);
    fixture.detectChanges();
    http.expectOne('/api/peer-groups').flush({ versions });
    http.expectOne('/api/panel-versions').flush({ versions: [flowControl] });
    http.expectOne('/api/fits').flush({ fits: [doneFit(second.id)] });
    await settled();
  }

  async function answerSides(): Promise<void> {
    for (const group of [first, second])
      http.expectOne(`/api/peer-groups/${group.id}`).flush(group);
    await settled();
    for (const request of http.match(`/api/panel-versions/${flowControl.id}/companies`))
      request.flush({ companies: sized(['Velmara', 'Kesdrin', 'Tolvane']) });
    await settled();
  }

  function words(): string {
    return ((fixture.nativeElement as HTMLElement).textContent ?? '').replace(/\s+/g, ' ');
  }

  it('shows who moved with both reasons, and what came of each', async () => {
    await open([second, first], first.id, second.id);
    await answerSides();
    expect(words()).toContain('Version 2 leaves out Tolvane, unlike version 1');
    const row = (fixture.nativeElement as HTMLElement).querySelector('tbody tr');
    const cells = [...(row?.children ?? [])].map((cell) => cell.textContent.trim());
    expect(cells).toEqual(['Tolvane', 'moved', 'inValves', 'outConcessions']);
    expect(words()).toContain('The same in both: 1');
    expect(words()).toContain('Standing, EUR m');
    expect(words()).toContain('Version 1 has no fit that is done.');
    expect(words()).toContain(shortCaution);
  });

  it('compares the newest with the one before it where the address names none, and others on request', async () => {
    await open([second, first]);
    await answerSides();
    const [left, right] = (fixture.nativeElement as HTMLElement).querySelectorAll('select');
    expect([left.value, right.value]).toEqual([first.id, second.id]);
    left.value = second.id;
    left.dispatchEvent(new Event('change'));
    await settled();
    expect(TestBed.inject(Router).url).toBe(`/peers/compare?a=${second.id}&b=${second.id}`);
  });

  it('asks for two versions where there is only one', async () => {
    await open([first]);
    expect(words()).toContain('Two versions are needed');
  });
});
